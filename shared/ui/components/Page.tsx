/** The frame of a screen: a fixed head and foot, and the sheet that scrolls between them. */
import type { ReactNode } from 'react';
import { ScrollView, useWindowDimensions, View } from 'react-native';

import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { isWide, line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  /** the screen's one level-1 heading; a run screen sets its own */
  title?: string | undefined;
  /** what the title belongs to, in small capitals above it */
  eyebrow?: string | undefined;
  /** stands at the right of the title */
  aside?: ReactNode;
  /** stays at the top: the `PowerBand` */
  head?: ReactNode;
  /** stays at the bottom: the `StopBar` */
  foot?: ReactNode;
  /** widest that the sheet gets, in CSS pixels */
  maxWidth?: number | undefined;
  /** no margins at the sides, for a sheet that hangs on its stud rail */
  bleed?: boolean | undefined;
  children: ReactNode;
}

/** The main region of the page; nothing of a screen stands outside it. */
export function Page({ title, eyebrow, aside, head, foot, maxWidth = 1120, bleed = false, children }: Props) {
  const { colors } = useTheme();
  const wide = isWide(useWindowDimensions().width);
  const side = bleed ? 0 : wide ? space.xxl : space.l;
  return (
    <View role="main" style={{ flex: 1, minHeight: 0, backgroundColor: colors.paper }}>
      {head}
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1, alignItems: 'center' }}>
        <View
          style={{
            flexGrow: 1,
            width: '100%',
            maxWidth,
            paddingHorizontal: side,
            paddingTop: bleed ? 0 : wide ? space.xl : space.l,
            paddingBottom: bleed ? 0 : space.huge,
            gap: bleed ? 0 : space.xl,
          }}
        >
          {title ? (
            <View style={{ borderBottomWidth: line.rule, borderBottomColor: colors.ink, paddingBottom: space.m, gap: space.xs }}>
              {eyebrow ? <Label>{eyebrow}</Label> : null}
              <View
                style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', justifyContent: 'space-between', gap: space.m }}
              >
                <View style={{ flexShrink: 1 }}>
                  <Heading level={1}>{title}</Heading>
                </View>
                {aside}
              </View>
            </View>
          ) : null}
          {children}
        </View>
      </ScrollView>
      {foot}
    </View>
  );
}
