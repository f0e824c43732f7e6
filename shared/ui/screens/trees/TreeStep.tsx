/** One step of a tree, hanging on its stud: what is done, what can hurt, and where each answer leads. */
import { View } from 'react-native';

import { HAZARDS } from '@/flows/document/hazards';
import type { Step } from '@/flows/document/steps';
import type { Tree } from '@/flows/document/tree';
import { formatNumber } from '@/shared/quantity/formatQuantity';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Heading } from '@/shared/ui/components/Heading';
import { SafetySign } from '@/shared/ui/components/icons/SafetySign';
import { Label } from '@/shared/ui/components/Label';
import { LinkText } from '@/shared/ui/components/LinkText';
import { StudRail } from '@/shared/ui/components/StudRail';
import { StepExits } from '@/shared/ui/screens/trees/StepExits';
import { CONTACT_WORDS, END_WORDS, hazardWords, KIND_WORDS, stepFacts } from '@/shared/ui/screens/trees/treeWords';
import { signOf } from '@/shared/ui/screens/trees/signOf';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  tree: Tree;
  /** the called tree, at a call */
  callee: Tree | undefined;
  /** place in the tree, from 0 */
  at: number;
}

/** Read-only; the number is the place in the tree. */
export function TreeStep({ tree, callee, at }: Props) {
  const { colors } = useTheme();
  const step = tree.steps[at];
  if (step === undefined) return null;
  return (
    <View role="listitem" nativeID={`step-${step.id}`} style={{ borderBottomWidth: line.hair, borderBottomColor: colors.rule }}>
      <StudRail number={at + 1} above={at > 0} below={at < tree.steps.length - 1}>
        <View style={{ gap: space.xs }}>
          <Label>{headOf(step)}</Label>
          <Heading level={3}>{step.title}</Heading>
        </View>
        <View>
          {step.lines.map((words) => (
            <BodyText key={words}>{words}</BodyText>
          ))}
        </View>
        {stepFacts(step, tree).map((fact) => (
          <BodyText key={fact} tone="soft">
            {fact}
          </BodyText>
        ))}
        {step.kind === 'call' ? (
          <LinkText
            label={`The called tree: ${callee?.title ?? step.tree}`}
            href={step.version === null ? `/trees/${step.tree}` : `/trees/${step.tree}?version=${step.version}`}
          />
        ) : null}
        {step.hazards.length > 0 ? (
          <View style={{ gap: space.s }}>
            {step.hazards.map((kind) => (
              <View key={kind} style={{ flexDirection: 'row', gap: space.m, alignItems: 'center' }}>
                <SafetySign name={signOf(kind)} size={30} />
                <View style={{ flex: 1 }}>
                  <BodyText>
                    <BodyText inline bold>{`${HAZARDS[kind].signal[0]?.toUpperCase() ?? ''}${HAZARDS[kind].signal.slice(1)}: `}</BodyText>
                    {hazardWords(kind)}
                  </BodyText>
                </View>
              </View>
            ))}
          </View>
        ) : null}
        <StepExits tree={tree} callee={callee} step={step} />
      </StudRail>
    </View>
  );
}

function headOf(step: Step): string {
  if (step.kind === 'end') return `${KIND_WORDS.end} · ${END_WORDS[step.says]}`;
  return [KIND_WORDS[step.kind], CONTACT_WORDS[step.contact], ...(step.minutes > 0 ? [`${formatNumber(step.minutes)} min`] : [])].join(
    ' · ',
  );
}
