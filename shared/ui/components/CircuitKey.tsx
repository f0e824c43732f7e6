/** What each number of a circuit is, what flows in it, and what is wrong. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { CallOut } from '@/shared/ui/components/CallOut';
import { voltsOf } from '@/shared/ui/components/circuitModel';
import { CIRCUIT_KIND_WORDS } from '@/shared/ui/components/circuitSymbols';
import { Mono } from '@/shared/ui/components/Mono';
import { space } from '@/shared/ui/theme/space';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Circuit, CircuitBranch } from '@/shared/workings/plot';

/** What a branch carries, or that it carries nothing because it is open; nothing in a drawing that is not about amps. */
export function currentWords({ amps, mark }: Pick<CircuitBranch, 'amps' | 'mark'>): string {
  if (mark === 'opened') return 'opened';
  if (amps === undefined) return '';
  return amps === null ? 'not known' : formatQuantity(Math.abs(amps), 'A', { digits: 3 });
}

/** What is wrong comes first, the rest in the order of the drawing's numbers. */
export function CircuitKey({ circuit }: { circuit: Circuit }) {
  const wrong = circuit.nodes.filter((node) => node.trouble !== undefined);
  return (
    <View role="list" aria-label={`Key of ${circuit.title}`} style={{ gap: space.xs }}>
      {wrong.map((node) => (
        <View key={node.id} role="listitem">
          <BodyText bold>{`${node.label}: ${voltsOf(node)}, ${node.trouble ?? ''}`}</BodyText>
        </View>
      ))}
      {circuit.branches.map((branch, i) => (
        <View key={branch.id} role="listitem" style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
          <View aria-hidden>
            <CallOut number={i + 1} strong={branch.lit === true || branch.mark === 'opened'} />
          </View>
          <View style={{ flex: 1, minWidth: 0 }}>
            <BodyText size="small" bold={branch.trouble !== undefined || branch.mark !== undefined}>
              {`${branch.label}${branch.label.toLowerCase().includes(CIRCUIT_KIND_WORDS[branch.kind]) ? '' : `, ${CIRCUIT_KIND_WORDS[branch.kind]}`}${currentWords(branch) === '' ? '' : ': '}`}
              {currentWords(branch) === '' ? null : (
                <Mono inline whole>
                  {currentWords(branch)}
                </Mono>
              )}
              {branch.mark === 'accused' ? ', accused' : ''}
              {branch.trouble === undefined ? '' : `, ${branch.trouble}`}
            </BodyText>
          </View>
        </View>
      ))}
    </View>
  );
}
