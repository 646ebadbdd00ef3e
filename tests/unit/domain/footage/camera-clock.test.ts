import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { cameraClock, clockErrorAt, shopTimeAt } from '../../../../src/domain/footage/camera-clock.ts';

const MORNING = Date.UTC(2026, 10, 12, 8);
const EVENING = MORNING + 36_000_000;
const slate = (camera: number, ahead: number) => ({
  camera: new Fraction(camera),
  shop: new Fraction(camera + ahead),
});
const shop = (clock: ReturnType<typeof cameraClock>, at: number) =>
  shopTimeAt(clock, new Fraction(at)).sub(at).valueOf();

describe('A camera’s clock', () => {
  it('is believed while there is no slate', () => {
    expect(shop(cameraClock([]), MORNING)).toBe(0);
    expect(clockErrorAt([], new Fraction(MORNING))).toMatchObject({ drift: null });
  });

  it('is off by as much everywhere after one slate', () => {
    const clock = cameraClock([slate(MORNING, 90_500)]);
    expect([MORNING - 1e6, MORNING, EVENING].map((at) => shop(clock, at))).toEqual([90_500, 90_500, 90_500]);
    expect(clockErrorAt(clock, new Fraction(EVENING)).offset.valueOf()).toBe(90.5);
  });

  it('drifts evenly through two slates, and on outside of them', () => {
    // Half a second in ten hours is 1.2 s a day.
    const clock = cameraClock([slate(EVENING, 61_000), slate(MORNING, 60_500)]);
    expect(shop(clock, (MORNING + EVENING) / 2)).toBe(60_750);
    expect(shop(clock, EVENING + 36_000_000)).toBe(61_500);
    const { offset, drift } = clockErrorAt(clock, new Fraction(EVENING));
    expect([offset.valueOf(), drift?.valueOf()]).toEqual([61, 1.2]);
  });

  it('goes from slate to slate when there are more', () => {
    const clock = cameraClock(
      [0, 1, 2].map((day) => slate(MORNING + day * 86_400_000, [0, 1000, 4000][day]!)),
    );
    expect(shop(clock, MORNING + 43_200_000)).toBe(500);
    expect(shop(clock, MORNING + 129_600_000)).toBe(2500);
  });

  it('was set between two slates that differ by more than a clock drifts: then the nearest counts', () => {
    const clock = cameraClock([slate(MORNING, 3_600_000), slate(EVENING, 0)]);
    expect(shop(clock, MORNING + 1)).toBe(3_600_000);
    expect(shop(clock, EVENING - 1)).toBe(0);
    expect(clockErrorAt(clock, new Fraction(MORNING)).drift).toBeNull();
  });

  it('shows at every slate exactly what was filmed, and never runs back', () => {
    const times = fc.uniqueArray(fc.nat(1000), { minLength: 1, maxLength: 6 });
    fc.assert(
      fc.property(
        times,
        fc.infiniteStream(fc.integer({ min: -3, max: 3 })),
        fc.nat(2000),
        (hours, off, extra) => {
          const next = off[Symbol.iterator]();
          const clock = cameraClock(hours.map((hour) => slate(hour * 3_600_000, Number(next.next().value))));
          for (const { camera, shop: shown } of clock) expect(shopTimeAt(clock, camera)).toEqual(shown);
          const at = new Fraction(extra * 1_800_000);
          expect(shopTimeAt(clock, at.add(1000)).compare(shopTimeAt(clock, at))).toBeGreaterThan(0);
        },
      ),
    );
  });
});
