import type { SaturationTable } from '../saturation-table';

// prettier-ignore
const SATURATION_PA: readonly number[] = [
  530648, 553965, 578048, 602910, 628570, 655041, 682342, 710486, 739492, 769375, 800151, 831837, 864449,
  898004, 932519, 968011, 1004500, 1041990, 1080510, 1120080, 1160710, 1202420, 1245220, 1289140, 1334190,
  1380390, 1427760, 1476310, 1526070, 1577050, 1629260, 1682740, 1737490, 1793530, 1850890, 1909590, 1969630,
  2031040, 2093840, 2158060, 2223700, 2290790, 2359350, 2429400, 2500950, 2574040, 2648680, 2724890, 2802690,
  2882110, 2963160, 3045880, 3130270, 3216370, 3304200, 3393780, 3485140, 3578300, 3673290, 3770120, 3868840,
  3969470, 4072020, 4176540, 4283060, 4391590, 4502180, 4614860, 4729660, 4846620, 4965770, 5087150, 5210800,
  5336770, 5465110, 5595850, 5729050, 5864780, 6003080, 6144040, 6287730, 6434240, 6583680, 6736150, 6891820,
  7050890, 7213690,
];

/**
 * Saturation of R-744 (carbon dioxide), 217.15 K to 303.15 K in steps of 1 K, six significant digits.
 * Figures: CoolProp 8.0.0 (HEOS). Begins above the triple point (216.592 K). The safety class is from memory
 * of ANSI/ASHRAE Standard 34 and not read from its text.
 */
export const R_744: SaturationTable = {
  designation: 'R-744',
  names: ['R744', 'CO2', 'carbon dioxide'],
  composition: [{ designation: 'R-744', massPercent: 100 }],
  model: 'pure-fluid Helmholtz EOS',
  source: 'CoolProp 8.0.0 (HEOS)',
  reference: 'R. Span & W. Wagner, J. Phys. Chem. Ref. Data 25, 1509 (1996)',
  criticalK: 304.128,
  criticalPa: 7377300,
  lowerLimitK: 217.15,
  upperLimitK: 303.128,
  temperaturesK: { startK: 217.15, stepK: 1 },
  bubblePa: SATURATION_PA,
  dewPa: SATURATION_PA,
  glide: false,
  safetyClass: 'A1',
  limitNote: null,
};
