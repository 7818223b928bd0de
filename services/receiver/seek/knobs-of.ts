import type { Design } from '../design';
import type { Figures } from '../figures';
import { shownQuantity, type Found } from '../findings/finding';
import { PI } from '../numeric/trig';
import { centre } from '../schema/value';
import { changeTo, changeValue, threeFigures } from './changes';
import {
  betterCoil,
  closer,
  detectorTap,
  first,
  inductance,
  looser,
  padderUp,
  strayDown,
  trimmerDown,
  tuningEnd,
  type Knob,
  type Step,
} from './knobs';

/** Return resistors that are sold, from the usual range of a ceramic phone. */
const RETURNS = [
  10e3, 12e3, 15e3, 18e3, 22e3, 27e3, 33e3, 39e3, 47e3, 56e3, 68e3, 82e3, 100e3, 150e3, 220e3, 330e3, 470e3, 680e3, 1e6,
];
/** A small transformer for such a set: winding resistance in ohm, loss in dB (common practice). */
const WINDING_R = 1500;
const WINDING_LOSS = 3;
/** Lowest frequency of speech that the transformer has to pass. */
const SPEECH_FROM = 300;

function one(step: Step | null): Knob {
  return step === null ? [] : [step];
}

function otherDetector(design: Design, input: unknown): Knob {
  if (design.detector.class === 'germanium' && design.detector.is === undefined && design.detector.vf1mA === undefined)
    return [];
  const to = { class: 'germanium', measured: design.detector.measured };
  return one({ text: 'Take a germanium diode.', changes: [changeTo(input, 'detector', to)] });
}

function measuredDetector(input: unknown): Knob {
  const changes = [changeTo(input, 'detector.measured', true)];
  return one({ text: 'Measure three points of its curve and enter what comes out.', changes });
}

function* returnResistor(design: Design, input: unknown, direction: 'up' | 'down'): Knob {
  const now = design.returnResistor === undefined ? NaN : centre(design.returnResistor);
  const list = direction === 'up' ? RETURNS : [...RETURNS].reverse();
  for (const r of list) {
    if (!(direction === 'up' ? r > now : r < now)) continue;
    const text = `Take a return resistor of ${shownQuantity(r, 'Ω')} instead of ${shownQuantity(now, 'Ω')}.`;
    yield { text, changes: [changeValue(input, 'returnResistor', r)] };
  }
}

function bypassDown(design: Design, input: unknown): Knob {
  if (design.bypass === undefined) return [];
  const now = centre(design.bypass);
  return [0.5, 0.2, 0.1, 0.01].map((part) => {
    const to = threeFigures(Math.max(1e-12, now * part), 'down');
    return {
      text: `Take a bypass of ${shownQuantity(to, 'F')} instead of ${shownQuantity(now, 'F')}.`,
      changes: [changeValue(input, 'bypass', to)],
    };
  });
}

function directPathSteps(design: Design, input: unknown): Knob {
  const now = design.returnResistor === undefined ? 'none' : shownQuantity(centre(design.returnResistor), 'Ω');
  const text = `Put 100 kΩ across the phone${now === 'none' ? '' : ` instead of ${now}`}.`;
  return one({ text, changes: [changeTo(input, 'returnResistor', 100e3)] });
}

/** A transformer whose ratio brings the earphone near the detector's output resistance. */
function* transformer({ design, audioFigures, phone }: Figures, input: unknown): Knob {
  const source = audioFigures.outputR;
  if (source === null || phone.kind === 'ceramic') return;
  const size = Math.sqrt(phone.r * phone.r + phone.x * phone.x);
  const best = Math.sqrt(source / size);
  for (const part of [1, 0.7, 1.4, 0.5, 2, 3]) {
    const ratio = Math.min(500, Math.max(1, Math.round(best * part)));
    const text = `Put a transformer of ${ratio}:1 between detector and earphone.`;
    if (design.transformer !== undefined) {
      yield { text, changes: [changeValue(input, 'transformer.ratio', ratio)] };
    } else {
      const primaryL = threeFigures(Math.min(1e5, Math.max(1, source / (2 * PI * SPEECH_FROM))), 'up');
      yield {
        text,
        changes: [changeTo(input, 'transformer', { ratio, primaryR: WINDING_R, primaryL, loss: WINDING_LOSS })],
      };
    }
  }
}

function selfCapacitanceSteps({ design, coil, rules }: Figures, input: unknown): Knob {
  const steps: Step[] = [];
  const w = 2 * PI * design.band.hi * rules.selfResonanceSpan;
  const most = 1 / (w * w * coil.l);
  if (design.coil.cSelf !== undefined) {
    const to = threeFigures(most, 'down');
    const text = `Wind the coil with less self-capacitance: at most ${shownQuantity(to, 'F')}. Space the turns or split the winding.`;
    steps.push({ text, changes: [changeValue(input, 'coil.cSelf', to)] });
  } else if (design.coil.kind === 'solenoid' && design.coil.former !== 'air') {
    steps.push({
      text: 'Wind the coil in air, on ribs instead of a tube.',
      changes: [changeTo(input, 'coil.former', 'air')],
    });
  }
  return steps;
}

/** An earth lead, and where it brings the band out of reach a looser coupling with it. */
function* earthLead(design: Design, input: unknown): Knob {
  const lead = changeTo(input, 'earth', { kind: 'resistance', r: 50 });
  yield { text: 'Give the set an earth lead.', changes: [lead] };
  for (const { text, changes } of looser(design, input))
    yield { text: `Give the set an earth lead. ${text}`, changes: [lead, ...changes] };
}

function formerSteps({ coil, rules }: Figures, input: unknown): Knob {
  if (coil.length === null) return [];
  const need = Math.ceil((coil.length + 2 * rules.formerMargin) * 1000 + 0.5) / 1000;
  return one({
    text: `Take a former of ${(need * 1000).toFixed(0)} mm.`,
    changes: [changeValue(input, 'coil.formerLength', need)],
  });
}

function shareOrder({ limits }: Figures, end?: 'lo' | 'hi'): string[] {
  return [...new Set(limits.filter((limit) => end === undefined || limit.end === end).map((limit) => limit.path))];
}

function lowEnd(design: Design, input: unknown): Knob[] {
  return [inductance(design, input, 'up'), tuningEnd(design, input, 'max'), padderUp(design, input)];
}

function highEnd(design: Design, input: unknown): Knob[] {
  return [
    inductance(design, input, 'down'),
    looser(design, input),
    tuningEnd(design, input, 'min'),
    trimmerDown(design, input),
    strayDown(design, input),
  ];
}

/** What may clear a finding, the usual remedy first. An empty list: no change of the file alone does it. */
export function knobsOf({ code, path }: Pick<Found, 'code' | 'path'>, figures: Figures, input: unknown): Knob[] {
  const { design } = figures;
  switch (code) {
    case 'BAND-LOW':
      return lowEnd(design, input);
    case 'BAND-HIGH':
      return highEnd(design, input);
    case 'BAND-CORNER':
      return [
        closer(input, shareOrder(figures, path === 'band.lo' ? 'lo' : 'hi')),
        ...(path === 'band.lo' ? lowEnd : highEnd)(design, input),
      ];
    case 'BAND-YIELD':
      return [
        first(closer(input, shareOrder(figures)), 3),
        first(inductance(design, input, 'up'), 5),
        first(inductance(design, input, 'down'), 5),
        closer(input, shareOrder(figures)),
      ];
    case 'BAND-GAP':
      return [tuningEnd(design, input, 'max'), tuningEnd(design, input, 'min')];
    case 'BAND-AERIAL':
    case 'AERIAL-RES':
    case 'SEL-STRONG':
      return [looser(design, input)];
    case 'Q-LOW':
      return [detectorTap(design, input), looser(design, input), betterCoil(design, input)];
    case 'COIL-SRF':
      return [selfCapacitanceSteps(figures, input)];
    case 'DET-UNSUIT':
    case 'DET-WEAK':
      return [otherDetector(design, input)];
    case 'DET-DATA':
      return [measuredDetector(input)];
    case 'PHONE-Z':
      return [
        transformer(figures, input),
        returnResistor(design, input, 'up'),
        bypassDown(design, input),
        otherDetector(design, input),
      ];
    case 'PHONE-DC':
      return [directPathSteps(design, input)];
    case 'PHONE-LOWPASS':
      return [returnResistor(design, input, 'down'), bypassDown(design, input)];
    case 'PHONE-DAMP':
      return [detectorTap(design, input), otherDetector(design, input), returnResistor(design, input, 'up')];
    case 'EARTH-NONE':
      return [earthLead(design, input)];
    case 'FORMER-SHORT':
      return [formerSteps(figures, input)];
    default:
      return [];
  }
}
