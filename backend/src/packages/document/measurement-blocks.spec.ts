import { beforeAll, describe, expect, it } from '@jest/globals';
import { writeFileSync } from 'node:fs';
import { PassThrough } from 'node:stream';
import type { MeasurementAnswer, MeasurementBoxes } from '#shared/checklist/kinds/measurement';
import type { MethodKey } from '#shared/checklist/methods/method-keys';
import type { UnitId } from '#shared/units/unit';
import { readPages } from '../../pdf/read-pdf.fixture';
import { measuredSteps } from './measured-steps.fixture';
import { CircuitBuilder, packageOf, pair } from './package.fixture';
import { writePackageDocument } from './write-package-document';

function measured(
  method: MethodKey,
  quantities: Record<string, [string, UnitId]>,
  rows: { quantities: Record<string, [string, UnitId]>; words?: Record<string, string> }[] = [],
): MeasurementAnswer {
  const typed = (given: Record<string, [string, UnitId]>): MeasurementBoxes['quantities'] =>
    Object.fromEntries(Object.entries(given).map(([key, [text, unit]]) => [key, { text, unit }]));
  return {
    kind: 'measurement',
    method,
    quantities: typed(quantities),
    words: {},
    rows: rows.map((row) => ({ quantities: typed(row.quantities), words: row.words ?? {} })),
  };
}

/** A case that came down within six hours and then swung a little about 36 °F. */
function airLog() {
  const atS = Array.from({ length: 960 }, (_, index) => index * 120);
  return {
    atS,
    temperatureK: atS.map((at) => 275.4 + 20 * Math.exp(-at / 4000) + 0.8 * Math.sin(at / 1500)),
  };
}

async function documentIn(language: 'en' | 'es'): Promise<Buffer> {
  const circuit = new CircuitBuilder(1, 'Rack A', 'The whole rack', measuredSteps(1))
    .answer(
      'test',
      measured('pressureTest', {
        startPressure: ['300', 'psig'],
        startTemperature: ['80', 'degF'],
        endPressure: ['294', 'psig'],
        endTemperature: ['70', 'degF'],
        held: ['24', 'h'],
        gaugeAccuracy: ['1', 'psi_diff'],
        temperatureAccuracy: ['1', 'degF_diff'],
      }),
    )
    .answer(
      'vacuum',
      measured(
        'evacuation',
        { ambientTemperature: ['70', 'degF'] },
        ['280', '310', '335', '352', '361', '366'].map((microns, index) => ({
          quantities: { since: [String(index * 12), 'min'], pressure: [microns, 'micron'] },
        })),
      ),
    )
    .answer(
      'charge',
      measured('refrigerantCharge', {}, [
        {
          quantities: { before: ['125.0', 'lb'], after: ['25.4', 'lb'] },
          words: { cylinder: 'C-1041', refrigerant: 'R-448A', direction: 'in' },
        },
        {
          quantities: { before: ['125.2', 'lb'], after: ['80.2', 'lb'] },
          words: { cylinder: 'C-1042', refrigerant: 'R-448A', direction: 'in' },
        },
      ]),
    )
    .answer('superheat', {
      kind: 'superheat',
      asFound: { valve: 'steady', pair: pair('50.0', '45') },
      asLeft: {
        valve: 'series',
        readings: Array.from({ length: 40 }, (_, index) => ({
          atS: index * 30,
          ...pair('50.0', (31.5 + 3 * Math.sin((index * 30) / 40)).toFixed(1)),
        })),
      },
      turns: [
        { turns: 0.25, direction: 'clockwise', at: '2026-11-24T15:00:00.000Z' },
        { turns: 0.25, direction: 'clockwise', at: '2026-11-24T15:20:00.000Z' },
      ],
      clockwise: 'raisesSuperheat',
      instruments: {
        gauge: 'vented',
        pressureAccuracy: { text: '1', unit: 'psi_diff' },
        temperatureAccuracy: { text: '1', unit: 'degF_diff' },
      },
    })
    .answer('air', {
      kind: 'trend',
      file: { name: 'probe-07.csv', sha256: 'c'.repeat(64), rows: 960 },
      startText: '11/23/2026 06:00 PM',
      column: 'Air (°F)',
      ...airLog(),
    });
  const out = new PassThrough();
  const chunks: Buffer[] = [];
  out.on('data', (chunk: Buffer) => chunks.push(chunk));
  await writePackageDocument(packageOf([circuit], new Map(), language), out, {
    signal: new AbortController().signal,
    onProgress: () => undefined,
  });
  const bytes = Buffer.concat(chunks);
  const folder = process.env['FIRSTCOLD_KEEP_PDF'];
  if (folder) writeFileSync(`${folder}/measured-${language}.pdf`, bytes);
  return bytes;
}

describe('measurements in the package', () => {
  let english: string;
  let spanish: string;
  const flat = (text: string): string => text.replace(/\s+/g, ' ');
  beforeAll(async () => {
    english = flat(readPages(await documentIn('en')).join(' '));
    spanish = flat(readPages(await documentIn('es')).join(' '));
  }, 60_000);

  it('tell the weather from a leak, with what was typed and how it was worked out', () => {
    // 300 psig at 80 °F is 294.17 psig at 70 °F: Gay-Lussac's law, worked out by hand.
    expect(english).toContain('Tight: the change is the weather.');
    expect(english).toContain('Pressure expected now 294.2 psig');
    expect(english).toContain('Pressure at the end 294 psig');
    expect(spanish).toContain('Sin fuga: el cambio es por el clima.');
  });

  it('list every reading of a vacuum and every cylinder', () => {
    expect(english).toContain('Dry and tight.');
    expect(english).toContain('366 µm Hg');
    expect(english).toContain('C-1042');
    // 99.6 lb and 45.0 lb went in.
    expect(english).toContain('Charge 144.60 lb');
    expect(spanish).toContain('Número de cilindro');
  });

  it('tell a series with both means, the turns of the valve and the instruments’ error', () => {
    expect(english).toContain('40 readings over 20 min');
    expect(english).toContain('time-weighted mean');
    expect(english).toContain('Valve turned: 0.25 clockwise, 0.25 clockwise');
    expect(english).toContain('instruments’ error ±');
    expect(spanish).toContain('en sentido horario');
  });

  it('draw a log with its band', () => {
    expect(english).toContain('Reached the band and held it.');
    expect(english).toContain('probe-07.csv, 960 rows');
    expect(english).toContain('11/23/2026 06:00 PM');
  });
});
