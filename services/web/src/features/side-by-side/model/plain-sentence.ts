import { formatQuantity, formatShare } from '../../../shared/format/number.js';
import type { Compared } from './compared.js';
import { differingConditions } from './conditions.js';
import { equalWithinRounding } from './differences.js';

/** worse: unwelcome or a warning; better: welcome; even: neither. */
export type Tone = 'worse' | 'better' | 'even';

export interface Sentence {
  readonly tone: Tone;
  readonly text: string;
}

/** From this share of the beam on, beam that was turned away is said in the first lines. */
const NOTABLE_SHARE_OF_BEAM = 0.01;
/** From this share of what the load needs on, heat that nobody supplied is said in the first lines. */
const NOTABLE_SHARE_OF_LOAD = 0.001;

/**
 * The first lines of the page: what the other scenario gains and gives up against the baseline, and on which
 * condition. What is unwelcome is said before what is welcome, and runs that do not answer one question are
 * said to be so before any number.
 */
export function plainSentences(baseline: Compared, other: Compared): Sentence[] {
  return [
    ...incomparable(baseline, other),
    headline(baseline, other),
    ...auxiliaryPower(baseline, other),
    ...turnedAway(other),
    ...turnedAway(baseline),
    ...unmet(other),
    ...unmet(baseline),
  ];
}

function incomparable(baseline: Compared, other: Compared): Sentence[] {
  const differing = differingConditions(baseline, other);
  if (differing.length === 0) return [];
  return [
    {
      tone: 'worse',
      text: `Not like for like: ${quoted(other)} and ${quoted(baseline)} differ in ${listed(differing.map(({ words }) => words))}, so their difference does not come from the machines alone. Run both on the same conditions for an answer.`,
    },
  ];
}

interface Clause {
  readonly tone: Tone;
  readonly text: string;
}

function headline(baseline: Compared, other: Compared): Sentence {
  const heat = clause(baseline.summary.heatDeliveredKwh, other.summary.heatDeliveredKwh, 'solar heat');
  const power = clause(baseline.summary.powerAcKwh, other.summary.powerAcKwh, 'electricity');
  const neitherMakesPower = baseline.summary.powerAcKwh === 0 && other.summary.powerAcKwh === 0;
  const clauses = neitherMakesPower ? [heat] : inOrderOfTone([power, heat]);
  const told =
    clauses.length === 2 && clauses.every(({ tone }) => tone === 'even')
      ? 'gives as much electricity and as much solar heat to the load'
      : clauses.map(({ text }) => text).join(join(clauses));
  const tone: Tone = clauses.find((one) => one.tone !== 'even')?.tone ?? 'even';
  const powerless = neitherMakesPower ? ' Neither makes electricity.' : '';
  return {
    tone,
    text: `Against ${quoted(baseline)}, ${quoted(other)} ${told} in the year, ${condition(baseline, other)}.${powerless}`,
  };
}

/** One clause that stands behind the scenario's name. */
function clause(baselineKwh: number, otherKwh: number, what: 'solar heat' | 'electricity'): Clause {
  const to = what === 'solar heat' ? `${what} to the load` : what;
  if (equalWithinRounding(baselineKwh, otherKwh, 'kWh')) {
    return { tone: 'even', text: `gives as much ${to}` };
  }
  const gains = otherKwh > baselineKwh;
  const size = `${kwh(Math.abs(otherKwh - baselineKwh))} of ${to}`;
  const share =
    baselineKwh > 0
      ? ` (${formatShare(Math.abs(otherKwh - baselineKwh) / baselineKwh)} ${gains ? 'more' : 'less'})`
      : '';
  return {
    tone: gains ? 'better' : 'worse',
    text: `${gains ? 'gains' : 'gives up'} ${size}${share}`,
  };
}

/** What is unwelcome first; otherwise in the order given. */
function inOrderOfTone(clauses: Clause[]): Clause[] {
  const rank: Readonly<Record<Tone, number>> = { worse: 0, better: 1, even: 2 };
  return clauses.toSorted((a, b) => rank[a.tone] - rank[b.tone]);
}

function join(clauses: readonly Clause[]): string {
  const tones = new Set(clauses.map(({ tone }) => tone));
  return tones.has('worse') && tones.has('better') ? ', but ' : ' and ';
}

function condition(baseline: Compared, other: Compared): string {
  const differing = new Set(differingConditions(baseline, other).map(({ condition }) => condition));
  const weather = differing.has('weatherYear')
    ? `each on its own weather year (${baseline.weatherYearName} / ${other.weatherYearName})`
    : `on the weather year “${baseline.weatherYearName}”`;
  const load =
    differing.has('heatLoad') || differing.has('electricityUse')
      ? 'with different loads'
      : `with the same loads (${kwh(baseline.summary.loadHeatKwh)} of heat and ${kwh(baseline.document.use.electricity.annualUseKwh)} of electricity)`;
  return `${weather} and ${load}`;
}

/** Pump and tracker eat into the electricity gained; said when it is more than rounding. */
function auxiliaryPower(baseline: Compared, other: Compared): Sentence[] {
  const uses = [baseline, other].map(({ summary }) => summary.pumpUseKwh + summary.trackerUseKwh);
  const [before = 0, after = 0] = uses;
  if (equalWithinRounding(before, after, 'kWh')) return [];
  const more = after > before;
  return [
    {
      tone: more ? 'worse' : 'better',
      text: `Its pump and tracker use ${kwh(Math.abs(after - before))} of electricity ${more ? 'more' : 'less'} in the year; that is not taken off the figure above.`,
    },
  ];
}

function turnedAway({ name, summary }: Compared): Sentence[] {
  const { defocusedReceiverLimit, defocusedStoreFull } = summary.ledger.lines;
  const notable = (energyKwh: number) => energyKwh > NOTABLE_SHARE_OF_BEAM * summary.beamOnApertureKwh;
  const size = (energyKwh: number) =>
    `${kwh(energyKwh)} of beam (${formatShare(energyKwh / summary.beamOnApertureKwh)} of the year's)`;
  const found: Sentence[] = [];
  if (notable(defocusedReceiverLimit)) {
    found.push({
      tone: 'worse',
      text: `“${name}” turned off the sun to keep its receiver below its temperature limit: ${size(defocusedReceiverLimit)} were not collected.`,
    });
  }
  if (notable(defocusedStoreFull)) {
    found.push({
      tone: 'worse',
      text: `“${name}” turned off the sun because its store was full: ${size(defocusedStoreFull)} were not collected.`,
    });
  }
  return found;
}

function unmet({ name, summary }: Compared): Sentence[] {
  if (!(summary.unmetHeatKwh > NOTABLE_SHARE_OF_LOAD * summary.loadHeatKwh)) return [];
  return [
    {
      tone: 'worse',
      text: `With “${name}” the load goes without ${kwh(summary.unmetHeatKwh)} of heat that neither sun nor backup supplies.`,
    },
  ];
}

function kwh(energyKwh: number): string {
  return formatQuantity(energyKwh, 'kWh');
}

function quoted({ name }: Compared): string {
  return `“${name}”`;
}

function listed(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1) ?? ''}`;
}
