import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { toSi } from '../../units/convert';
import { pascalAbsolute, second } from '../../units/quantity';
import { LEVELLED_SLOPE_FRACTION, riseShape, type RiseShape, type VacuumReading } from './rise-shape';

const series = (times: readonly number[], microns: (minute: number) => number): VacuumReading[] =>
  times.map((minute) => ({
    at: second(minute * 60),
    pressure: pascalAbsolute(toSi(microns(minute), 'micron')),
  }));

const everyMinutes = (step: number, end: number): number[] =>
  Array.from({ length: Math.floor(end / step) + 1 }, (_, index) => index * step);

const water =
  (fromMicrons: number, restMicrons: number, timeConstantMin: number) =>
  (minute: number): number =>
    restMicrons - (restMicrons - fromMicrons) * Math.exp(-minute / timeConstantMin);

function shapeOf(readings: readonly VacuumReading[]): RiseShape {
  const shape = riseShape(readings);
  if (shape === null) throw new Error('no shape');
  return shape;
}

describe('riseShape', () => {
  // Straight lines and exponentials, worked by hand.
  it('finds both slopes of a steady leak, and no plateau', () => {
    const shape = shapeOf(series(everyMinutes(5, 60), (minute) => 300 + 20 * minute));
    const slope = toSi(20, 'micron') / 60;
    expect(shape.startSlopePaPerS).toBeCloseTo(slope, 9);
    expect(shape.endSlopePaPerS).toBeCloseTo(slope, 9);
    expect(shape.levelled).toBe(false);
    expect(shape.plateau).toBeNull();
  });

  it('finds where water comes to rest', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 600, max: 20000, noNaN: true }),
        fc.double({ min: 8, max: 25, noNaN: true }),
        (rest, timeConstantMin) => {
          const shape = shapeOf(series(everyMinutes(1, 60), water(300, rest, timeConstantMin)));
          expect(shape.levelled).toBe(true);
          expect(Math.abs((shape.plateau ?? NaN) / toSi(rest, 'micron') - 1)).toBeLessThan(0.02);
        },
      ),
    );
  });

  it('still calls it rising when water is far from its rest', () => {
    const shape = shapeOf(series(everyMinutes(5, 60), water(300, 5000, 120)));
    expect(shape.levelled).toBe(false);
    expect(Math.abs((shape.plateau ?? NaN) / toSi(5000, 'micron') - 1)).toBeLessThan(0.05);
  });

  it('takes the threshold itself as levelled', () => {
    const bend = (end: number): boolean =>
      shapeOf(series([0, 1, 2, 3], (minute) => [400, 800, 900, 900 + end][minute] ?? NaN)).levelled;
    expect(bend(400 * LEVELLED_SLOPE_FRACTION)).toBe(true);
    expect(bend(400 * LEVELLED_SLOPE_FRACTION + 1)).toBe(false);
  });

  it('takes a fall at the end as levelled, at rest where it is', () => {
    const shape = shapeOf(series([0, 1, 2, 3], (minute) => [300, 700, 720, 710][minute] ?? NaN));
    expect(shape.levelled).toBe(true);
    expect(shape.plateau).toBeCloseTo(toSi(710, 'micron'), 9);
  });

  it('takes a rise that begins late as rising', () => {
    const shape = shapeOf(series([0, 1, 2, 3], (minute) => [300, 300, 500, 800][minute] ?? NaN));
    expect(shape.levelled).toBe(false);
    expect(shape.plateau).toBeNull();
  });

  it('is not moved by one wild reading', () => {
    const wild = series(everyMinutes(1, 60), water(300, 1500, 10)).map((reading, index) =>
      index === 55 ? { ...reading, pressure: pascalAbsolute(5000) } : reading,
    );
    expect(shapeOf(wild).levelled).toBe(true);
  });

  it('needs two readings in the first and in the last third', () => {
    const flat = (times: readonly number[]): RiseShape | null => riseShape(series(times, () => 400));
    expect(flat([0, 60])).toBeNull();
    expect(flat([0, 30, 60])).toBeNull();
    expect(flat([0, 10, 60])).toBeNull();
    expect(flat([0, 20, 40, 60])).not.toBeNull();
    expect(flat([])).toBeNull();
  });
});
