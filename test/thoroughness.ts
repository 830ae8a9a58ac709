/** Set by `npm run soak`: the same laws on many more drawn cases. */
const SOAKING = process.env['NORMLOOM_SOAK'] === '1';

/** How often something is tried: so many times in every test run, more in a soak. */
export function tries(usual: number, soaking: number): number {
  return SOAKING ? soaking : usual;
}
