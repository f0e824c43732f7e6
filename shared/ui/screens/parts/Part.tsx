/** One ruled part of the parts sheet. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { Heading } from '@/shared/ui/components/Heading';
import { Rule } from '@/shared/ui/components/Rule';
import { space } from '@/shared/ui/theme/space';

/** A heading over the states of one component. */
export function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <View style={{ gap: space.l, alignSelf: 'stretch' }}>
      <View style={{ gap: space.xs }}>
        <Heading level={2}>{title}</Heading>
        <Rule weight="strong" />
      </View>
      {children}
    </View>
  );
}
