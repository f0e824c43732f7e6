/** The named answers of a step and where each leads. */
import { View } from 'react-native';

import type { Exit, Step } from '@/flows/document/steps';
import type { Tree } from '@/flows/document/tree';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { EVIDENCE_SAYS, exitVerdict, exitWords, shownWords } from '@/shared/ui/screens/trees/treeWords';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  tree: Tree;
  callee: Tree | undefined;
  step: Step;
}

/** One ruled row an exit: answer, verdict, next step, and what it says about the suspects. */
export function StepExits({ tree, callee, step }: Props) {
  const { colors } = useTheme();
  if (step.exits.length === 0) return null;
  const ends = new Map((callee?.steps ?? []).flatMap((s): [string, string][] => (s.kind === 'end' ? [[s.id, s.title]] : [])));
  const placeOf = (id: string) => {
    const at = tree.steps.findIndex((s) => s.id === id);
    return at === -1 ? id : `${at + 1} ${tree.steps[at]?.title ?? id}`;
  };
  return (
    <View role="list" aria-label={`Exits of ${step.title}`}>
      {step.exits.map((exit: Exit) => (
        <View
          key={exit.id}
          role="listitem"
          style={{
            flexDirection: 'row',
            flexWrap: 'wrap',
            columnGap: space.m,
            paddingVertical: space.xs,
            borderTopWidth: line.hair,
            borderTopColor: colors.rule,
          }}
        >
          <View style={{ flexGrow: 2, flexShrink: 1, flexBasis: 150, minWidth: 0 }}>
            <BodyText bold>{exitWords(exit, ends)}</BodyText>
            <BodyText size="small" tone="soft">
              {[exitVerdict(exit), ...(exit.shows === undefined ? [] : [shownWords(exit.shows)])].join(', ')}
            </BodyText>
          </View>
          <View style={{ flexGrow: 3, flexShrink: 1, flexBasis: 190, minWidth: 0 }}>
            <View style={{ flexDirection: 'row', gap: space.s, alignItems: 'flex-start' }}>
              <View style={{ paddingTop: 3 }}>
                <Icon name="right" size={20} color={colors.inkSoft} />
              </View>
              <View style={{ flex: 1 }}>
                <BodyText>{placeOf(exit.to)}</BodyText>
              </View>
            </View>
            {exit.atMost !== undefined && exit.then !== undefined ? (
              <BodyText size="small" tone="soft">{`${exit.atMost} times at most, then ${placeOf(exit.then)}`}</BodyText>
            ) : null}
            {exit.reason ? (
              <BodyText size="small" tone="soft">
                {exit.reason}
              </BodyText>
            ) : null}
            {(exit.evidence ?? [])
              .filter((e) => e.says !== 'says-nothing')
              .map((e) => (
                <BodyText
                  key={e.suspect}
                  size="small"
                  tone="brass"
                >{`${EVIDENCE_SAYS[e.says]} ${tree.suspects.find((s) => s.id === e.suspect)?.part ?? e.suspect}`}</BodyText>
              ))}
          </View>
        </View>
      ))}
    </View>
  );
}
