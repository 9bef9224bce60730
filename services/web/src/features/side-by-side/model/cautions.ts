import type { Compared } from './compared.js';

export interface Caution {
  readonly key: 'focus' | 'hotFace' | 'freezing' | 'scald' | 'electricity';
  readonly title: string;
  readonly text: string;
}

/** Common practice, no source: above this a steel or copper face and its coating need a maker's word. */
export const HOT_FACE_C = 550;
/** Common practice, no source: water above this scalds within seconds. */
export const SCALD_C = 60;

/** Stands above every list of cautions. */
export const DEFER_TO_CODES =
  'This is a calculation, not a permit: local codes and licensed practice decide, and they come before anything said here.';

/** What can hurt someone, said where the results stand that show it. */
export function cautions(all: readonly Compared[]): Caution[] {
  const found: Caution[] = [
    {
      key: 'focus',
      title: 'The focus blinds and burns',
      text: `A dish that faces the sun can injure eyes and set things alight at and near its focus, also while it moves on or off the sun and when it is left half built. Keep people, sight lines and anything that burns away from it.`,
    },
  ];
  const hot = all.filter(({ summary }) => summary.faceMaxC > HOT_FACE_C);
  if (hot.length > 0) {
    found.push({
      key: 'hotFace',
      title: `The receiver's face reaches ${atMost(hot, ({ summary }) => summary.faceMaxC)} °C`,
      text: `${names(hot)}: above about ${HOT_FACE_C} °C ordinary metal, coating and insulation lose strength or burn, and a stopped pump makes it hotter still. Ask the maker for the limit and for what turns the dish off the sun without power.`,
    });
  }
  const freezing = all.filter(({ summary }) => summary.pipeFreezeHours > 0);
  if (freezing.length > 0) {
    found.push({
      key: 'freezing',
      title: `Water in a pipe below 0 °C for up to ${atMost(freezing, ({ summary }) => summary.pipeFreezeHours)} h`,
      text: `${names(freezing)}: a loop with plain water would freeze and can burst, and thawing water runs out hot or cold where nobody expects it. Draining, heat tracing or an antifreeze must be designed in.`,
    });
  }
  const scalding = all.filter(
    ({ summary, document }) =>
      Math.max(
        summary.tankTopMaxC,
        summary.outletMaxC,
        ...document.use.loads.map(({ setPointC }) => setPointC),
      ) > SCALD_C,
  );
  if (scalding.length > 0) {
    found.push({
      key: 'scald',
      title: `Water hotter than ${SCALD_C} °C scalds`,
      text: `${names(scalding)}: store, pipes and taps hold water that burns skin within seconds, and shut-in water builds pressure as it warms. Mixing valves, relief valves and signs belong to the design; store water that is kept lukewarm can breed legionella.`,
    });
  }
  const live = all.filter(({ summary }) => summary.powerDcKwh > 0);
  if (live.length > 0) {
    found.push({
      key: 'electricity',
      title: 'Cells in light are live',
      text: `${names(live)}: direct current flows whenever light falls on the cells, also with the inverter off, and it does not let go of an arc.`,
    });
  }
  return found;
}

function names(all: readonly Compared[]): string {
  return all.map(({ name }) => `“${name}”`).join(', ');
}

function atMost(all: readonly Compared[], value: (one: Compared) => number): string {
  return Math.round(Math.max(...all.map(value))).toLocaleString('en-GB');
}
