// Draws icon.svg and, with an installed Chromium, icon.png from it: `node assets/icon/draw-icon.mjs`.
import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { chromium } from 'playwright';
import { findBrowser } from '../../test/run/find-browser.mjs';

const SIZE = 512;
const PAPER = '#fdfcf9';
const EDGE = '#d8d3c7';
const CURVE = '#0d5a66';

// Cumulative shares of a symmetric score distribution, one for each step from the left.
const SHARES = [0.03, 0.11, 0.27, 0.5, 0.73, 0.89, 0.97];
const LEFT = 96;
const RIGHT = 416;
const BASE = 400;
const TOP = 112;

const width = (RIGHT - LEFT) / SHARES.length;
const height = (share) => BASE - share * (BASE - TOP);
const steps = SHARES.map((share, index) => `${height(share).toFixed(1)}H${(LEFT + (index + 1) * width).toFixed(1)}`);

const svg = `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${SIZE} ${SIZE}" width="${SIZE}" height="${SIZE}">
  <rect x="20" y="20" width="472" height="472" rx="72" fill="${PAPER}" stroke="${EDGE}" stroke-width="8"/>
  <path d="M${LEFT} ${BASE + 26}H${RIGHT}" fill="none" stroke="${EDGE}" stroke-width="12" stroke-linecap="round"/>
  <path d="M${LEFT} ${steps.join('V')}" fill="none" stroke="${CURVE}" stroke-width="26" stroke-linejoin="round" stroke-linecap="round"/>
</svg>
`;

/** @param {string} name */
const beside = (name) => fileURLToPath(new URL(name, import.meta.url));

writeFileSync(beside('icon.svg'), svg);
const browser = await chromium.launch({ executablePath: findBrowser(console.error) ?? undefined });
const page = await browser.newPage({ viewport: { width: SIZE, height: SIZE } });
await page.setContent(`<body style="margin:0">${svg}</body>`);
await page.screenshot({ path: beside('icon.png'), omitBackground: true });
await browser.close();
