import { toSi } from '../../units/convert';

/** One published value: what the source prints, in kelvin and absolute pascals, and half its last printed digit in kelvin. */
export type PublishedPoint = readonly [
  refrigerant: string,
  phase: 'bubble' | 'dew',
  temperatureK: number,
  pressurePa: number,
  resolutionK: number,
  asPublished: string,
];

/** Values copied from one source, named by its title. */
export interface PublishedGroup {
  readonly source: string;
  readonly points: readonly PublishedPoint[];
}

/** 0 °C in kelvin. */
const ICE_K = toSi(0, 'degC');

/**
 * Published saturation values of the refrigerants we ship. psig were turned into Pa with 14.696 psia (14.7 where the
 * source says so). R-744 at 30.0 °C is left out for lying above the range that we answer (it agrees to 0.004 K); these for
 * looking wrong in their source:
 * - an unattributed single-column R-404A table (three points, 0.28 to 0.41 K off, while REFPROP 9.1 and Arkema's chart
 *   agree with us to 0.06 K), and R-404A's dew point in ASHRAE 2017 Table 2 (0.33 K off, contradicted by the property
 *   table of the same chapter);
 * - the R-407C table of an air conditioner's manual (0.4 to 0.7 K off the refrigerant distributor's chart);
 * - R-407F below −46 °C (the transcribed chart scatters by 0.7 K from row to row);
 * - a safety data sheet's vapour pressure of R-1234yf at 54.4 °C (three ASHRAE points agree to 0.04 K).
 */
export const PUBLISHED_GROUPS: readonly PublishedGroup[] = [
  {
    source: 'VDI Heat Atlas, 2nd ed., saturation tables (via CalebBell/chemicals data files)',
    // prettier-ignore
    points: [
      ['R-134a', 'dew', 220, 24430, 0.003, '24430 Pa at 220 K'],
      ['R-134a', 'dew', 265, 215670, 0.001, '215670 Pa at 265 K'],
      ['R-134a', 'dew', 285, 440830, 0, '440830 Pa at 285 K'],
      ['R-134a', 'dew', 305, 811970, 0, '811970 Pa at 305 K'],
      ['R-134a', 'dew', 325, 1380300, 0.001, '1.3803e+06 Pa at 325 K'],
      ['R-134a', 'dew', 345, 2205900, 0.001, '2.2059e+06 Pa at 345 K'],
      ['R-22', 'dew', 200, 16670, 0.005, '16670 Pa at 200 K'],
      ['R-22', 'dew', 225, 70910, 0.001, '70910 Pa at 225 K'],
      ['R-22', 'dew', 275, 528650, 0, '528650 Pa at 275 K'],
      ['R-22', 'dew', 300, 1097000, 0.002, '1.097e+06 Pa at 300 K'],
      ['R-22', 'dew', 325, 2026400, 0.001, '2.0264e+06 Pa at 325 K'],
      ['R-290', 'dew', 200, 20190, 0.004, '20190 Pa at 200 K'],
      ['R-290', 'dew', 250, 217960, 0.001, '217960 Pa at 250 K'],
      ['R-290', 'dew', 275, 501800, 0, '501800 Pa at 275 K'],
      ['R-290', 'dew', 300, 997700, 0, '997700 Pa at 300 K'],
      ['R-290', 'dew', 325, 1783300, 0.001, '1.7833e+06 Pa at 325 K'],
    ],
  },
  {
    source:
      'ASHRAE Handbook-Fundamentals (SI) 2017, Ch. 29 Refrigerants, physical properties table (normal boiling point; from NIST REFPROP 9.0)',
    // prettier-ignore
    points: [
      ['R-1234yf', 'bubble', 243.7, 101325, 0.005, 'NBP -29.45 degC'],
      ['R-1234ze(E)', 'bubble', 254.2, 101325, 0.005, 'NBP -18.95 degC'],
      ['R-134a', 'bubble', 247.076, 101325, 0.005, 'NBP -26.074 degC'],
      ['R-22', 'bubble', 232.34, 101325, 0.005, 'NBP -40.81 degC'],
      ['R-290', 'bubble', 231.04, 101325, 0.005, 'NBP -42.11 degC'],
      ['R-32', 'bubble', 221.499, 101325, 0.005, 'NBP -51.651 degC'],
      ['R-404A', 'bubble', 226.928, 101325, 0.005, 'NBP -46.222 degC'],
      ['R-410A', 'bubble', 221.704, 101325, 0.005, 'NBP -51.446 degC'],
      ['R-507A', 'bubble', 226.409, 101325, 0.005, 'NBP -46.741 degC'],
    ],
  },
  {
    source:
      'ASHRAE Handbook-Fundamentals (SI) 2017, Ch. 29 Refrigerants, comparative performance table (evaporator/condenser pressure at -31.7/-6.7/7.2/30 degC; NIST CYCLE_D)',
    // prettier-ignore
    points: [
      ['R-1234yf', 'dew', 280.372, 401000, 0.039, '0.401 MPa at 7.2 degC'],
      ['R-1234yf', 'dew', 303.15, 783000, 0.024, '0.783 MPa at 30.0 degC'],
      ['R-1234ze(E)', 'dew', 266.483, 168000, 0.076, '0.168 MPa at -6.7 degC'],
      ['R-1234ze(E)', 'dew', 280.372, 280000, 0.051, '0.280 MPa at 7.2 degC'],
      ['R-134a', 'dew', 280.372, 377000, 0.039, '0.377 MPa at 7.2 degC'],
      ['R-22', 'dew', 241.483, 152000, 0.076, '0.152 MPa at -31.7 degC'],
      ['R-22', 'dew', 266.483, 399000, 0.037, '0.399 MPa at -6.7 degC'],
      ['R-22', 'dew', 280.372, 626000, 0.026, '0.626 MPa at 7.2 degC'],
      ['R-290', 'dew', 266.483, 385000, 0.04, '0.385 MPa at -6.7 degC'],
      ['R-32', 'dew', 266.483, 653000, 0.023, '0.653 MPa at -6.7 degC'],
      ['R-32', 'dew', 280.372, 1018000, 0.016, '1.018 MPa at 7.2 degC'],
      ['R-410A', 'dew', 280.372, 1000000, 0.017, '1.000 MPa at 7.2 degC'],
      ['R-410A', 'dew', 303.15, 1886000, 0.01, '1.886 MPa at 30.0 degC'],
      ['R-507A', 'dew', 241.483, 199000, 0.061, '0.199 MPa at -31.7 degC'],
      ['R-507A', 'dew', 266.483, 503000, 0.03, '0.503 MPa at -6.7 degC'],
      ['R-507A', 'dew', 303.15, 1460000, 0.013, '1.460 MPa at 30.0 degC'],
      ['R-744', 'dew', 266.483, 2909000, 0.006, '2.909 MPa at -6.7 degC'],
    ],
  },
  {
    source:
      'Moran & Shapiro, Fundamentals of Engineering Thermodynamics, Table A-7 Properties of saturated refrigerant 22',
    // prettier-ignore
    points: [
      ['R-22', 'dew', 223.15, 64510, 0.002, '0.6451 bar at -50 degC'],
      ['R-22', 'dew', 243.15, 163890, 0.001, '1.6389 bar at -30 degC'],
      ['R-22', 'dew', 253.15, 245340, 0.001, '2.4534 bar at -20 degC'],
      ['R-22', 'dew', 275.15, 531330, 0, '5.3133 bar at 2 degC'],
    ],
  },
  {
    source:
      'R-744 pressure-temperature chart (degC/bar g and degF/psig) as transcribed in coolprop-node tests; original issuer not named',
    // prettier-ignore
    points: [
      ['R-744', 'dew', 253.15, 1969325, 0.008, '18.68 bar g at -20 degC'],
      ['R-744', 'dew', ICE_K, 3485272.2, 0.004, '490.8 psig at 32 degF'],
      ['R-744', 'dew', 283.15, 4502325, 0.004, '44.01 bar g at 10 degC'],
    ],
  },
  {
    source: 'Carbon dioxide saturation properties table',
    // prettier-ignore
    points: [
      ['R-744', 'dew', 253.15, 1969600, 0.001, '1.9696 MPa at -20 degC'],
      ['R-744', 'dew', 258.15, 2290800, 0.001, '2.2908 MPa at -15 degC'],
      ['R-744', 'dew', 268.15, 3045900, 0.001, '3.0459 MPa at -5 degC'],
      ['R-744', 'dew', ICE_K, 3485100, 0.001, '3.4851 MPa at 0 degC'],
      ['R-744', 'dew', 275.15, 3673300, 0.001, '3.6733 MPa at 2 degC'],
    ],
  },
  {
    source: 'NIST REFPROP 9.1 output quoted in CoolProp issue #921 / REFPROP-issues #177',
    // prettier-ignore
    points: [
      ['R-404A', 'bubble', 225.389, 94061.9, 0, '225.38897 K at 94061.94 Pa (bubble)'],
      ['R-404A', 'dew', 226.15, 94061.9, 0, '94061.94 Pa at 226.150 K (dew)'],
      ['R-449A', 'dew', 233.15, 101325.1, 0, '101325.11 Pa at 233.150 K (dew)'],
    ],
  },
  {
    source: 'Forane R-404A pressure-temperature chart (degF/psig, liquid & vapor), republished page',
    // prettier-ignore
    points: [
      ['R-404A', 'bubble', 229.817, 115804.3, 0.064, '2.1 psig at -46 degF'],
      ['R-404A', 'bubble', 302.594, 1407881.9, 0.01, '189.5 psig at 85 degF'],
      ['R-404A', 'bubble', 338.706, 3250850.5, 0.005, '456.8 psig at 150 degF'],
      ['R-404A', 'dew', 229.817, 112357, 0.065, '1.6 psig at -46 degF'],
      ['R-404A', 'dew', 302.594, 1394092.3, 0.01, '187.5 psig at 85 degF'],
    ],
  },
  {
    source:
      'ASHRAE Handbook-Fundamentals (SI) 2017, Ch. 29 Refrigerants, Table 2 (normal bubble/dew points of blends)',
    // prettier-ignore
    points: [
      ['R-407A', 'bubble', 227.95, 101325, 0.05, '-45.2 degC at 101.325 kPa'],
      ['R-407A', 'dew', 234.45, 101325, 0.05, '-38.7 degC at 101.325 kPa'],
      ['R-407C', 'dew', 236.45, 101325, 0.05, '-36.7 degC at 101.325 kPa'],
      ['R-410A', 'bubble', 221.55, 101325, 0.05, '-51.6 degC at 101.325 kPa'],
      ['R-448A', 'bubble', 227.25, 101325, 0.05, '-45.9 degC at 101.325 kPa'],
      ['R-507A', 'bubble', 226.45, 101325, 0.05, '-46.7 degC at 101.325 kPa'],
    ],
  },
  {
    source: 'R-407A fact sheet: vapour pressure 10.93 bar at 25 degC, NBP -45.2/-38.7 degC',
    // prettier-ignore
    points: [
      ['R-407A', 'dew', 298.15, 1093000, 0.016, '10.93 bar at 25 degC (phase not stated)'],
    ],
  },
  {
    source:
      'R-407C product bulletin pressure-temperature chart (NIST REFPROP 8.0), degF, liquid and vapor psig / inHg',
    // prettier-ignore
    points: [
      ['R-407C', 'bubble', 238.706, 156483.4, 0.051, '8 psig at -30 degF'],
      ['R-407C', 'bubble', 247.039, 222673.1, 0.039, '17.6 psig at -15 degF'],
      ['R-407C', 'bubble', 266.483, 457094.8, 0.022, '51.6 psig at 20 degF'],
      ['R-407C', 'bubble', 269.261, 502600.2, 0.021, '58.2 psig at 25 degF'],
      ['R-407C', 'bubble', 272.039, 550863.5, 0.019, '65.2 psig at 30 degF'],
      ['R-407C', 'bubble', 285.928, 845959.1, 0.139, '108 psig at 55 degF'],
      ['R-407C', 'bubble', 291.483, 990749, 0.123, '129 psig at 65 degF'],
      ['R-407C', 'bubble', 297.039, 1156223.2, 0.11, '153 psig at 75 degF'],
      ['R-407C', 'bubble', 313.706, 1776751.4, 0.08, '243 psig at 105 degF'],
      ['R-407C', 'dew', 238.706, 113735.9, 0.064, '1.8 psig at -30 degF'],
      ['R-407C', 'dew', 241.483, 129593.9, 0.058, '4.1 psig at -25 degF'],
      ['R-407C', 'dew', 244.261, 146830.8, 0.052, '6.6 psig at -20 degF'],
      ['R-407C', 'dew', 252.594, 210952, 0.039, '15.9 psig at -5 degF'],
      ['R-407C', 'dew', 258.15, 264041.6, 0.033, '23.6 psig at 5 degF'],
      ['R-407C', 'dew', 260.928, 294378.6, 0.03, '28 psig at 10 degF'],
      ['R-407C', 'dew', 266.483, 363326.1, 0.026, '38 psig at 20 degF'],
      ['R-407C', 'dew', 294.261, 908012, 0.127, '117 psig at 70 degF'],
      ['R-407C', 'dew', 302.594, 1156223.2, 0.106, '153 psig at 85 degF'],
      ['R-407C', 'dew', 305.372, 1245855.1, 0.1, '166 psig at 90 degF'],
      ['R-407C', 'dew', 316.483, 1680224.8, 0.08, '229 psig at 110 degF'],
      ['R-407C', 'dew', 319.261, 1804330.4, 0.076, '247 psig at 115 degF'],
    ],
  },
  {
    source:
      'R-407F pressure-temperature chart (degC/psig, liquid & vapor) as transcribed in coolprop-node its reference data; original issuer not named',
    // prettier-ignore
    points: [
      ['R-407F', 'bubble', 229.15, 111781.4, 0.011, '1.52 psig at -47.2 degF'],
      ['R-407F', 'bubble', 235.15, 147547.5, 0.01, '6.70 psig at -36.4 degF'],
      ['R-407F', 'bubble', 239.15, 176931.7, 0.01, '10.97 psig at -29.2 degF'],
      ['R-407F', 'bubble', 241.15, 191624.1, 0.009, '13.10 psig at -25.6 degF'],
      ['R-407F', 'bubble', 251.15, 289639.8, 0.008, '27.31 psig at -7.6 degF'],
      ['R-407F', 'bubble', 283.15, 858631, 0.006, '109.84 psig at 50.0 degF'],
      ['R-407F', 'bubble', 293.15, 1143439.8, 0.006, '151.15 psig at 68.0 degF'],
      ['R-407F', 'bubble', 299.15, 1345577.7, 0.006, '180.46 psig at 78.8 degF'],
      ['R-407F', 'bubble', 309.15, 1742331.5, 0.006, '238.01 psig at 96.8 degF'],
      ['R-407F', 'bubble', 325.15, 2544340.4, 0.006, '354.33 psig at 125.6 degF'],
      ['R-407F', 'bubble', 331.15, 2906361.6, 0.006, '406.84 psig at 136.4 degF'],
      ['R-407F', 'dew', 245.15, 175217.9, 0.009, '10.72 psig at -18.4 degF'],
      ['R-407F', 'dew', 247.15, 191391.4, 0.009, '13.06 psig at -14.8 degF'],
      ['R-407F', 'dew', 249.15, 208254.4, 0.009, '15.51 psig at -11.2 degF'],
      ['R-407F', 'dew', 265.15, 392847.9, 0.007, '42.28 psig at 17.6 degF'],
      ['R-407F', 'dew', 275.15, 558197.7, 0.007, '66.26 psig at 35.6 degF'],
      ['R-407F', 'dew', 279.15, 638890.2, 0.007, '77.97 psig at 42.8 degF'],
      ['R-407F', 'dew', 287.15, 824727.7, 0.006, '104.92 psig at 57.2 degF'],
      ['R-407F', 'dew', 291.15, 931493.3, 0.006, '120.41 psig at 64.4 degF'],
      ['R-407F', 'dew', 293.15, 989118.1, 0.006, '128.76 psig at 68.0 degF'],
      ['R-407F', 'dew', 315.15, 1809733.6, 0.006, '247.78 psig at 107.6 degF'],
    ],
  },
  {
    source: 'Installation manual 506253-01 Table 5, R-410A temperature/pressure (degF/psig)',
    // prettier-ignore
    points: [
      ['R-410A', 'bubble', ICE_K, 796316.9, 0.014, '100.8 psig at 32 degF'],
      ['R-410A', 'bubble', 283.15, 1081759.8, 0.011, '142.2 psig at 50 degF'],
      ['R-410A', 'bubble', 288.706, 1270676.2, 0.01, '169.6 psig at 60 degF'],
      ['R-410A', 'bubble', 299.817, 1723661.7, 0.008, '235.3 psig at 80 degF'],
      ['R-410A', 'bubble', 305.372, 1991178.3, 0.007, '274.1 psig at 90 degF'],
      ['R-410A', 'bubble', 310.928, 2288342.4, 0.006, '317.2 psig at 100 degF'],
      ['R-410A', 'bubble', 316.483, 2617911.8, 0.006, '365 psig at 110 degF'],
    ],
  },
  {
    source: 'R-410A saturation table values quoted in NIST REFPROP-issues #402 (MPa abs -> degC)',
    // prettier-ignore
    points: [
      ['R-410A', 'bubble', 317.75, 2700000, 0.005, '2.70 MPa -> 44.60 degC'],
      ['R-410A', 'dew', 316.29, 2600000, 0.005, '2.60 MPa -> 43.14 degC'],
      ['R-410A', 'dew', 317.88, 2700000, 0.005, '2.70 MPa -> 44.73 degC'],
    ],
  },
  {
    source:
      'R-448A pressure-temperature chart (degF/psig, liquid & vapor) as transcribed in coolprop-node its reference data; original issuer not named',
    // prettier-ignore
    points: [
      ['R-448A', 'bubble', 238.706, 173058.4, 0.051, '10.40 psig at -30.0 degF'],
      ['R-448A', 'bubble', 249.817, 273032.4, 0.037, '24.90 psig at -10.0 degF'],
      ['R-448A', 'bubble', 266.483, 499869.9, 0.025, '57.80 psig at 20.0 degF'],
      ['R-448A', 'bubble', 283.15, 845986.7, 0.143, '108.00 psig at 50.0 degF'],
      ['R-448A', 'bubble', 288.706, 990776.6, 0.127, '129.00 psig at 60.0 degF'],
      ['R-448A', 'bubble', 294.261, 1163145.5, 0.114, '154.00 psig at 70.0 degF'],
      ['R-448A', 'bubble', 299.817, 1349303.9, 0.103, '181.00 psig at 80.0 degF'],
      ['R-448A', 'bubble', 305.372, 1556146.6, 0.093, '211.00 psig at 90.0 degF'],
      ['R-448A', 'bubble', 310.928, 1783673.6, 0.084, '244.00 psig at 100.0 degF'],
      ['R-448A', 'bubble', 322.039, 2314569.9, 0.071, '321.00 psig at 120.0 degF'],
      ['R-448A', 'bubble', 327.594, 2617939.2, 0.065, '365.00 psig at 130.0 degF'],
      ['R-448A', 'bubble', 333.15, 2955782.3, 0.06, '414.00 psig at 140.0 degF'],
      ['R-448A', 'dew', 233.15, 101352.9, 0.075, '0.00 psig at -40.0 degF'],
      ['R-448A', 'dew', 238.706, 131689.9, 0.062, '4.40 psig at -30.0 degF'],
      ['R-448A', 'dew', 272.039, 496422.5, 0.025, '57.30 psig at 30.0 degF'],
      ['R-448A', 'dew', 277.594, 598464.9, 0.023, '72.10 psig at 40.0 degF'],
      ['R-448A', 'dew', 283.15, 714986.3, 0.02, '89.00 psig at 50.0 degF'],
      ['R-448A', 'dew', 288.706, 845986.7, 0.141, '108.00 psig at 60.0 degF'],
      ['R-448A', 'dew', 299.817, 1170040.3, 0.111, '155.00 psig at 80.0 degF'],
      ['R-448A', 'dew', 305.372, 1363093.5, 0.1, '183.00 psig at 90.0 degF'],
      ['R-448A', 'dew', 310.928, 1576830.9, 0.09, '214.00 psig at 100.0 degF'],
    ],
  },
  {
    source: 'R-448A properties page (normal bubble/dew, saturated-liquid pressure at 25/50 degC)',
    // prettier-ignore
    points: [
      ['R-448A', 'bubble', 227.25, 101325, 0.05, '-45.9 degC at 1 atm'],
      ['R-448A', 'bubble', 323.15, 2372800, 0.001, '23.728 bar at 50 degC'],
    ],
  },
  {
    source:
      'R-449A pressure-temperature chart (degF/psig, liquid & vapor) as transcribed in coolprop-node its reference data; original issuer not named',
    // prettier-ignore
    points: [
      ['R-449A', 'bubble', 235.928, 152374.2, 0.01, '7.40 psig at -35.0 degF'],
      ['R-449A', 'bubble', 238.706, 171679.5, 0.01, '10.20 psig at -30.0 degF'],
      ['R-449A', 'bubble', 249.817, 270979.9, 0.008, '24.61 psig at -10.0 degF'],
      ['R-449A', 'bubble', 258.15, 370292.9, 0.008, '39.01 psig at 5.0 degF'],
      ['R-449A', 'bubble', 288.706, 983940.9, 0.006, '128.01 psig at 60.0 degF'],
      ['R-449A', 'bubble', 299.817, 1335552.2, 0.006, '179.01 psig at 80.0 degF'],
      ['R-449A', 'bubble', 305.372, 1535864.7, 0.006, '208.06 psig at 90.0 degF'],
      ['R-449A', 'bubble', 310.928, 1763756, 0.006, '241.12 psig at 100.0 degF'],
      ['R-449A', 'dew', 241.483, 148949.7, 0.01, '6.91 psig at -25.0 degF'],
      ['R-449A', 'dew', 247.039, 189627.7, 0.009, '12.81 psig at -15.0 degF'],
      ['R-449A', 'dew', 249.817, 213768.9, 0.009, '16.31 psig at -10.0 degF'],
      ['R-449A', 'dew', 255.372, 267609.9, 0.008, '24.12 psig at -0.0 degF'],
      ['R-449A', 'dew', 258.15, 298655.8, 0.008, '28.62 psig at 5.0 degF'],
      ['R-449A', 'dew', 260.928, 331760.1, 0.008, '33.42 psig at 10.0 degF'],
      ['R-449A', 'dew', 266.483, 406831.3, 0.007, '44.31 psig at 20.0 degF'],
      ['R-449A', 'dew', 269.261, 448868.6, 0.007, '50.41 psig at 25.0 degF'],
      ['R-449A', 'dew', 283.15, 710801.2, 0.007, '88.40 psig at 50.0 degF'],
      ['R-449A', 'dew', 291.483, 914889.3, 0.006, '118.00 psig at 65.0 degF'],
      ['R-449A', 'dew', 294.261, 990835.6, 0.006, '129.01 psig at 70.0 degF'],
      ['R-449A', 'dew', 297.039, 1073501.2, 0.006, '141.00 psig at 75.0 degF'],
      ['R-449A', 'dew', 299.817, 1165089.3, 0.006, '154.29 psig at 80.0 degF'],
      ['R-449A', 'dew', 305.372, 1357134.1, 0.006, '182.14 psig at 90.0 degF'],
      ['R-449A', 'dew', 324.817, 2217185.6, 0.006, '306.88 psig at 125.0 degF'],
    ],
  },
  {
    source:
      'R-507 pressure-temperature chart (degC/psig) as transcribed in coolprop-node tests; original issuer not named',
    // prettier-ignore
    points: [
      ['R-507A', 'bubble', 253.15, 314373.4, 0.029, '30.9 psig at -20 degC'],
      ['R-507A', 'bubble', 293.15, 1121749.4, 0.113, '148 psig at 20 degC'],
      ['R-507A', 'bubble', 303.15, 1458903.1, 0.009, '196.9 psig at 30 degC'],
    ],
  },
  {
    source: 'AllChem appendix 9: R-32 saturated vapour pressure table',
    // prettier-ignore
    points: [
      ['R-32', 'dew', 223.15, 110600, 0.009, '1.106 e5 Pa at -50 degC'],
      ['R-32', 'dew', 233.15, 177700, 0.006, '1.777 e5 Pa at -40 degC'],
      ['R-32', 'dew', 243.15, 273700, 0.004, '2.737 e5 Pa at -30 degC'],
      ['R-32', 'dew', 253.15, 406000, 0.003, '4.06 e5 Pa at -20 degC'],
      ['R-32', 'dew', 293.15, 1475900, 0.001, '14.759 e5 Pa at 20 degC'],
      ['R-32', 'dew', 303.15, 1928300, 0.001, '19.283 e5 Pa at 30 degC'],
      ['R-32', 'dew', 323.15, 3140300, 0.001, '31.403 e5 Pa at 50 degC'],
    ],
  },
];
