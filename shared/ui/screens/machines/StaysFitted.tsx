/** What earlier runs have left on the machine. */
import { View } from 'react-native';

import type { Profile } from '@/flows/document/profile';
import type { MachineTag } from '@/shared/contract/machines';
import { BodyText } from '@/shared/ui/components/BodyText';
import { LinkText } from '@/shared/ui/components/LinkText';
import { dateWords } from '@/shared/ui/screens/shell/dateWords';
import { Section } from '@/shared/ui/screens/shell/Section';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

const CLASS_WORDS = { link: 'link', bypass: 'bypass', series: 'series part', clip: 'clip', lifted: 'lifted lead' } as const;

interface Props {
  tags: readonly MachineTag[];
  profile: Profile;
}

/** Each with the run that left it; the next run starts with all of it counted. */
export function StaysFitted({ tags, profile }: Props) {
  const { colors } = useTheme();
  return (
    <Section title="Left on it by earlier runs" look="label">
      {tags.length === 0 ? <BodyText tone="soft">Nothing temporary is fitted, and no part is owed a check.</BodyText> : null}
      {tags.map((tag) => (
        <View
          key={tag.is === 'fitted' ? tag.thing.id : `${tag.part}-${tag.killer}`}
          style={{ borderLeftWidth: line.heavy + 1, borderLeftColor: colors.brass, paddingLeft: space.m }}
        >
          {tag.is === 'fitted' ? (
            <>
              <BodyText bold>{tag.thing.name}</BodyText>
              <BodyText
                size="small"
                tone="soft"
              >{`${CLASS_WORDS[tag.thing.class]}, ${tag.thing.area}, since ${dateWords(tag.since)}`}</BodyText>
            </>
          ) : (
            <>
              <BodyText bold>{`${partName(profile, tag.part)} is to be replaced`}</BodyText>
              <BodyText
                size="small"
                tone="soft"
              >{`First rule out what is known to have killed it: ${partName(profile, tag.killer)}. Since ${dateWords(tag.since)}.`}</BodyText>
            </>
          )}
          <LinkText label="The run that left it" href={`/records/${tag.run}`} />
        </View>
      ))}
    </Section>
  );
}

function partName(profile: Profile, id: string): string {
  return [...profile.stores, ...profile.devices].find((part) => part.id === id)?.name ?? id.replaceAll('-', ' ');
}
