import { describe, expect, it } from 'vitest';
import { burchChristensenMainsC } from '../../src/mains/burch-christensen.js';

describe('mains temperature by Burch & Christensen 2007 (coefficients from memory), worked by hand in °F', () => {
  // Air: mean 59 °F, monthly means 41 °F apart at most (15 °C, 22.777… K).
  // ratio = 0.4 + 0.01 (59 − 44) = 0.55; half the spread 20.5 °F; amplitude 11.275 °F; lag = 35 − 15 = 20 d.
  const climate = { meanC: 15, monthlySpreadK: 41 / 1.8, southern: false };

  it.each([
    // Day 35: 0.986 × 0 − 90 = −90°, sine −1: 65 − 11.275 = 53.725 °F.
    { day: 35, fahrenheit: 53.725 },
    // Day 126: 0.986 × 91 − 90 = −0.274°, sine −0.004782: 65 − 0.0539 = 64.9461 °F.
    { day: 126, fahrenheit: 64.9461 },
    // Day 218: 0.986 × 183 − 90 = 90.438°, sine 0.999971: 65 + 11.2747 = 76.2747 °F.
    { day: 218, fahrenheit: 76.2747 },
  ])('day $day is $fahrenheit °F', ({ day, fahrenheit }) => {
    expect(burchChristensenMainsC(climate, day)).toBeCloseTo((fahrenheit - 32) / 1.8, 3);
  });
});
