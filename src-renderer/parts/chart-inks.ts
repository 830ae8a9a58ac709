/** Colours of the moment, read from the page so that light and dark agree with it. */
export interface ChartInks {
  readonly ink: string;
  readonly soft: string;
  readonly rule: string;
  readonly curve: string;
  readonly paper: string;
}

export function inksOfPage(): ChartInks {
  const style = getComputedStyle(document.documentElement);
  const ink = (name: string): string => style.getPropertyValue(name).trim();
  return {
    ink: ink('--ink'),
    soft: ink('--soft'),
    rule: ink('--rule'),
    curve: ink('--curve'),
    paper: ink('--paper'),
  };
}
