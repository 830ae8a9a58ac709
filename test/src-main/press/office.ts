import { execFileSync } from 'node:child_process';
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import ExcelJS from 'exceljs';

export async function openWorkbook(bytes: Uint8Array): Promise<ExcelJS.Workbook> {
  const workbook = new ExcelJS.Workbook();
  const whole = new ArrayBuffer(bytes.length);
  new Uint8Array(whole).set(bytes);
  await workbook.xlsx.load(whole);
  return workbook;
}

/** Without written results a spreadsheet program has to compute. */
export function forgetResults(workbook: ExcelJS.Workbook): void {
  for (const sheet of workbook.worksheets) {
    sheet.eachRow((row) =>
      row.eachCell((cell) => {
        if (cell.formula) cell.value = { formula: cell.formula, date1904: false };
      }),
    );
  }
}

/** Converts files in one run of LibreOffice, with a profile of its own in the folder. */
export function convert(files: readonly string[], filter: string, folder: string, into: string): void {
  const profile = `-env:UserInstallation=${pathToFileURL(join(folder, 'profile')).href}`;
  execFileSync('soffice', ['--headless', profile, '--convert-to', filter, '--outdir', into, ...files], {
    stdio: 'ignore',
  });
}

/** The workbooks as LibreOffice computes them: written without results, opened, computed and saved, in one run. */
export async function recomputed(
  workbooks: readonly ExcelJS.Workbook[],
  folder: string,
): Promise<readonly ExcelJS.Workbook[]> {
  const names = workbooks.map((_, index) => `computed-${index}.xlsx`);
  await Promise.all(
    workbooks.map(async (workbook, index) => {
      forgetResults(workbook);
      await writeFile(join(folder, names[index] ?? ''), Buffer.from(await workbook.xlsx.writeBuffer()));
    }),
  );
  const into = join(folder, 'computed');
  convert(
    names.map((name) => join(folder, name)),
    'xlsx',
    folder,
    into,
  );
  return Promise.all(names.map(async (name) => openWorkbook(await readFile(join(into, name)))));
}

/** Every formula of a workbook with its result: "Workings Grade 5!K12" and 50. */
export function resultsOf(workbook: ExcelJS.Workbook): ReadonlyMap<string, unknown> {
  const results = new Map<string, unknown>();
  for (const sheet of workbook.worksheets) {
    sheet.eachRow((row) =>
      row.eachCell((cell) => {
        if (cell.formula) results.set(`${sheet.name}!${cell.address}`, cell.result);
      }),
    );
  }
  return results;
}
