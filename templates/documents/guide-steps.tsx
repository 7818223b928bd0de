import { Circle, Line, Path, Svg, Text, View } from '@react-pdf/renderer';
import type { Gate, GuideStepView } from '@/services/documents/schemas';
import { PdfDrawing } from '../drawings/as-pdf';
import { circuitDrawing } from '../drawings/circuit-drawing';
import { windingDrawing } from '../drawings/winding-drawing';
import type { GuideProps } from './guide-props';
import { PartPicture } from './part-picture';
import { Rail } from './rail';
import { Sheet, TickBox, black, give, grey, hair, measure, type } from './sheet';

/** One step, one page: what it needs, the drawing, the words, one check, and the rail at the foot. */
export function GuideSteps({ view, size }: GuideProps) {
  return view.steps.map((step) => (
    <Sheet
      key={step.number}
      size={size}
      plate={view.plate}
      seller={view.seller}
      bookmark={`Step ${step.number}: ${step.title}`}
      aside={<StepStrip at={step.number} of={view.steps.length} />}
    >
      <Text style={{ ...type.title, marginTop: 18 * give(size) ** 2 }}>{step.title}</Text>
      <YouNeed step={step} />
      <View style={{ marginTop: 10, marginBottom: 8, alignItems: 'center' }}>
        <StepDrawing step={step} view={view} share={give(size)} />
      </View>
      <Sentences text={step.text} />
      {step.check !== '' && <Check step={step} />}
      <View wrap={false} style={{ marginTop: 'auto' }}>
        <Rail reach={view.reach} />
      </View>
    </Sheet>
  ));
}

function StepDrawing({ step, view, share }: { step: GuideStepView; view: GuideProps['view']; share: number }) {
  if (step.drawing === 'winding') return <PdfDrawing drawing={windingDrawing(view.winding)} width={measure * share} />;
  if (step.drawing === 'circuit') return <PdfDrawing drawing={circuitDrawing(view.circuit)} width={measure * share} />;
  const many = step.uses.length > 4;
  const width = share * (step.uses.length === 1 ? 300 : step.uses.length === 2 ? 230 : many ? 118 : 150);
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'center', gap: 12 }}>
      {step.uses.map((part) => (
        <View key={part.reference} style={{ alignItems: 'center', width }}>
          <PartPicture family={part.family} width={width - 10} />
          <Text style={type.strong}>{part.reference}</Text>
        </View>
      ))}
    </View>
  );
}

function YouNeed({ step }: { step: GuideStepView }) {
  if (step.uses.length === 0) return null;
  return (
    <View
      style={{
        flexDirection: 'row',
        flexWrap: 'wrap',
        alignItems: 'center',
        gap: 12,
        rowGap: 4,
        borderWidth: 1.1,
        borderColor: black,
        borderRadius: 5,
        paddingHorizontal: 12,
        paddingVertical: 6,
        marginTop: 8,
      }}
    >
      <Text style={type.strong}>You need</Text>
      {step.uses.map((part) => (
        <View key={part.reference} style={{ flexDirection: 'row', alignItems: 'center', gap: 5 }}>
          <PartPicture family={part.family} width={30} />
          <Text style={type.body}>
            {part.reference}, {part.name}
            {part.amount === '1' ? '' : ` (${part.amount})`}
          </Text>
        </View>
      ))}
    </View>
  );
}

/** One action a number, in two columns: a sentence is found again after looking up from the work. */
function Sentences({ text }: { text: string }) {
  const sentences = text.match(/[^.!?]+(?:[.!?]+(?=\s|$)|$)|\S+/g)?.map((one) => one.trim()) ?? [text];
  const actions = joinShort(sentences.filter((one) => one !== ''));
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 20, rowGap: 8 }}>
      {actions.map((action, index) => (
        <View key={index} wrap={false} style={{ flexDirection: 'row', width: (measure - 20) / 2 }}>
          <Text style={{ ...type.section, fontSize: 22, lineHeight: 1, width: 28, marginTop: -5 }}>{index + 1}</Text>
          <Text style={{ ...type.body, flexGrow: 1, flexBasis: 0 }}>{action}</Text>
        </View>
      ))}
    </View>
  );
}

/** A sentence of a few words belongs to the one before it. */
function joinShort(sentences: readonly string[]): string[] {
  const joined: string[] = [];
  for (const sentence of sentences) {
    const last = joined.length - 1;
    if (last >= 0 && sentence.split(' ').length < 5) joined[last] = `${joined[last] ?? ''} ${sentence}`;
    else joined.push(sentence);
  }
  return joined;
}

function Check({ step }: { step: GuideStepView }) {
  return (
    <View
      wrap={false}
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        gap: 16,
        borderWidth: 1.9,
        borderColor: black,
        borderRadius: 6,
        padding: 11,
        marginTop: 12,
      }}
    >
      <View style={{ flexGrow: 1, flexBasis: 0 }}>
        <Text style={{ ...type.strong, fontSize: 13 }}>Check before you go on</Text>
        <Text style={type.body}>{step.check}</Text>
      </View>
      {step.gate ? (
        <GateDrawing gate={step.gate} />
      ) : (
        <View style={{ alignItems: 'center', gap: 4 }}>
          <TickBox />
          <Text style={type.small}>seen</Text>
        </View>
      )}
    </View>
  );
}

/** The same gate as in the check room, with a blank for the builder's own reading. */
function GateDrawing({ gate }: { gate: Gate }) {
  const bracket = { stroke: black, strokeWidth: 2.2, fill: 'none' };
  return (
    <View style={{ width: 150 }}>
      <Svg width={150} height={30} viewBox="0 0 150 30">
        <Line x1={4} y1={15} x2={146} y2={15} stroke={hair} strokeWidth={0.8} />
        <Path d="M48 5H40V25H48" {...bracket} />
        <Path d="M102 5H110V25H102" {...bracket} />
      </Svg>
      <View style={{ flexDirection: 'row', justifyContent: 'center', gap: 30 }}>
        <Text style={type.figures}>{gate.low}</Text>
        <Text style={type.figures}>
          {gate.high} {gate.unit}
        </Text>
      </View>
      <Text style={{ ...type.small, color: grey, textAlign: 'center', marginTop: 3 }}>mine: ____________</Text>
    </View>
  );
}

/** Progress as a terminal strip: screws with their wire fastened are done, the black one is now. */
function StepStrip({ at, of }: { at: number; of: number }) {
  const step = 20;
  const shown = Math.min(of, 12);
  const now = Math.min(at, shown);
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 10 }}>
      <Svg width={shown * step} height={18} viewBox={`0 0 ${shown * step} 18`}>
        {Array.from({ length: shown }, (_, index) => {
          const x = index * step + step / 2;
          const isDone = index + 1 < now;
          const isNow = index + 1 === now;
          return [
            index + 1 < now ? (
              <Line
                key={`wire ${x}`}
                x1={x + 6.5}
                y1={9}
                x2={x + step - 6.5}
                y2={9}
                stroke="#b4602b"
                strokeWidth={2.2}
              />
            ) : null,
            <Circle
              key={`screw ${x}`}
              cx={x}
              cy={9}
              r={6.5}
              fill={isNow ? black : isDone ? '#d98a52' : '#ffffff'}
              stroke={black}
              strokeWidth={1}
              {...(!isDone && !isNow && { strokeDasharray: '2 2' })}
            />,
            isDone || isNow ? (
              <Line
                key={`slot ${x}`}
                x1={x - 3.6}
                y1={10.8}
                x2={x + 3.6}
                y2={7.2}
                stroke={isNow ? '#ffffff' : black}
                strokeWidth={1.5}
              />
            ) : null,
          ];
        })}
      </Svg>
      <Text style={type.strong}>
        Step {at} of {of}
      </Text>
    </View>
  );
}
