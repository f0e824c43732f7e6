/** One ruled part of a page. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { Rule } from '@/shared/ui/components/Rule';
import { space } from '@/shared/ui/theme/space';

interface Props {
  title: string;
  /** `label` is the quiet form for side columns */
  look?: 'heading' | 'label' | undefined;
  aside?: ReactNode;
  children: ReactNode;
}

/** A heading of the page's outline over what belongs to it. */
export function Section({ title, look = 'heading', aside, children }: Props) {
  return (
    <View style={{ gap: space.m, alignSelf: 'stretch' }}>
      <View style={{ gap: space.xs }}>
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', justifyContent: 'space-between', gap: space.m }}>
          {look === 'heading' ? <Heading level={2}>{title}</Heading> : <Label level={2}>{title}</Label>}
          {aside}
        </View>
        {look === 'heading' ? <Rule weight="strong" /> : null}
      </View>
      {children}
    </View>
  );
}
