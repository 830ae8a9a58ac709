// Writes ostrey-vale-reading.csv: an invented reading survey of the invented Ostrey Vale school district.
// Run `node generate-ostrey-vale.mjs` to write the file again, or add --print to see it on stdout instead.
// Only + − × ÷, Math.round and Math.imul are used, so that every machine writes the same bytes.
import { writeFileSync } from 'node:fs';
import process from 'node:process';
import { fileURLToPath } from 'node:url';

const SEED = 20240917;
const COLUMNS = ['pupil_id', 'school', 'grade', 'form', 'age_months', 'raw_score', 'weight'];
const HIGHEST = 40;
const SCHOOL_SPREAD = 1.8;
const PUPIL_SPREAD = 6.6;
const FORM_B_HARDER = 0.9;

/** Pupils per grade whose rows are clean, the mean each grade is drawn around, and the age in months at its start. */
const GRADES = [
  { grade: 4, pupils: 1598, mean: 21.8, youngest: 109 },
  { grade: 5, pupils: 1613, mean: 25.7, youngest: 121 },
  { grade: 6, pupils: 1601, mean: 29.0, youngest: 133 },
];

/** Invented names with a relative size. */
const SCHOOLS = [
  ['Ambrill Road', 5],
  ['Brackory Green', 8],
  ['Calderwyke', 9],
  ['Dunnerick', 4],
  ['Eastry Combe', 7],
  ['Fellabeck', 3],
  ['Garrowmere', 10],
  ['Hollin Lane', 8],
  ['Ickery Bridge', 6],
  ['Jessamy Hill', 5],
  ['Kestery Cross', 7],
  ['Lammerley', 9],
  ['Marrowby Green', 6],
  ['Nethercairn', 4],
  ['Orrinshaw', 8],
  ['Pellamwood', 11],
  ['Quillbeck', 5],
  ['Rannoway', 7],
  ['Skerrow Hill', 6],
  ['Thrennock', 9],
  ['Ullamore', 4],
  ['Vellin Cross', 8],
  ['Wharrowdale', 10],
  ['Yarrick Mill', 6],
];

/** mulberry32, a public-domain generator of 32-bit numbers, as a fraction from 0 to below 1. */
function mulberry32(seed) {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

const random = mulberry32(SEED);

/** A whole number from 0 to below the limit. */
function below(limit) {
  return Math.floor(random() * limit);
}

/** Nearly standard normal: the sum of twelve uniform numbers less six. */
function nearlyNormal() {
  let sum = -6;
  for (let count = 0; count < 12; count += 1) sum += random();
  return sum;
}

function shuffled(values) {
  const order = [...values];
  for (let last = order.length - 1; last > 0; last -= 1) {
    const other = below(last + 1);
    [order[last], order[other]] = [order[other], order[last]];
  }
  return order;
}

/** Shares a whole number out by size; what rounding leaves goes to the first ones. */
function shareOut(total, sizes) {
  const all = sizes.reduce((sum, size) => sum + size, 0);
  const shares = sizes.map((size) => Math.floor((total * size) / all));
  const left = total - shares.reduce((sum, share) => sum + share, 0);
  return shares.map((share, index) => (index < left ? share + 1 : share));
}

/** A weight with four decimals, or three where the fourth is 0. */
function weightText(weight) {
  return weight.toFixed(4).replace(/0$/, '');
}

/** A whole score with a mild negative skew; one pupil in 150 hardly tries. */
function rawScore(mean, form) {
  const normal = nearlyNormal();
  const skewed = normal - 0.06 * (normal * normal - 1);
  if (random() < 1 / 150) return below(4);
  const score = Math.round(mean - (form === 'B' ? FORM_B_HARDER : 0) + PUPIL_SPREAD * skewed);
  return Math.min(HIGHEST, Math.max(0, score));
}

function cleanPupils() {
  const schools = SCHOOLS.map(([name, size]) => ({
    name,
    size,
    effect: SCHOOL_SPREAD * nearlyNormal(),
    weight: 0.6 + 0.76 * random(),
  }));
  const ids = shuffled(Array.from({ length: 9000 }, (_, index) => index + 1000));
  const pupils = [];
  const shares = GRADES.map(({ pupils: total }) =>
    shareOut(
      total,
      schools.map((school) => school.size),
    ),
  );
  schools.forEach((school, place) => {
    GRADES.forEach(({ grade, mean, youngest }, row) => {
      const form = shuffled(Array.from({ length: shares[row][place] }, (_, index) => (index % 2 === 0 ? 'A' : 'B')));
      for (const letter of form) {
        pupils.push({
          pupil_id: String(ids.pop()).padStart(6, '0'),
          school: school.name,
          grade: String(grade),
          form: letter,
          age_months: String(youngest + below(12) + (random() < 0.03 ? 6 : 0)),
          raw_score: String(rawScore(mean + school.effect, letter)),
          weight: weightText(school.weight * (0.92 + 0.16 * random())),
        });
      }
    });
  });
  return { pupils, ids };
}

/** Puts further rows in at places spread over the file. */
function spreadOver(rows, further) {
  const out = [...rows];
  for (const row of further) out.splice(1 + below(out.length - 2), 0, row);
  return out;
}

function withDirt({ pupils, ids }) {
  const model = () => ({ ...pupils[below(pupils.length)], pupil_id: String(ids.pop()).padStart(6, '0') });
  const spoilt = (column, texts) => texts.map((text) => ({ ...model(), [column]: text }));
  const line = (pupil) => COLUMNS.map((column) => pupil[column]).join(',');
  const twice = shuffled(pupils).slice(0, 9);
  const retested = { ...twice[8], raw_score: String((Number(twice[8].raw_score) + 5) % (HIGHEST + 1)) };
  const dirt = [
    ...twice.slice(0, 8),
    retested,
    ...spoilt(
      'raw_score',
      Array.from({ length: 14 }, () => '99'),
    ),
    ...spoilt(
      'raw_score',
      Array.from({ length: 9 }, () => ''),
    ),
    ...spoilt(
      'raw_score',
      Array.from({ length: 5 }, () => 'abs'),
    ),
    ...spoilt('raw_score', ['41', '42', '44', '43']),
    ...spoilt('raw_score', ['17.5', '22.5']),
    ...spoilt('grade', ['']),
    ...spoilt('weight', ['0', '-1.042', '']),
  ];
  const ragged = line(model()).split(',').slice(0, 4).join(',');
  return spreadOver(pupils.map(line), [...dirt.map(line), ragged, '', '', '']);
}

const text = `${[COLUMNS.join(','), ...withDirt(cleanPupils())].join('\n')}\n`;

if (process.argv.includes('--print')) {
  process.stdout.write(text);
} else {
  writeFileSync(fileURLToPath(new URL('ostrey-vale-reading.csv', import.meta.url)), text);
}
