/** The head of a table's column, which may turn the table's order. */
import { Pressable, View } from 'react-native';

import { Icon } from '@/shared/ui/components/icons/Icon';
import { Label } from '@/shared/ui/components/Label';
import { nextSort } from '@/shared/ui/components/tableSort';
import type { TableSort } from '@/shared/ui/components/tableSort';
import { space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webProps } from '@/shared/ui/theme/webStyle';

interface Props {
  id: string;
  title: string;
  grow: number;
  align: 'left' | 'right';
  sort: TableSort | null;
  onSort?: ((sort: TableSort) => void) | undefined;
}

/** Says its order to screen readers; pressable only where the column can be sorted. */
export function TableHeader({ id, title, grow, align, sort, onSort }: Props) {
  const { colors } = useTheme();
  const direction = sort?.column === id ? sort.direction : null;
  const justifyContent = align === 'right' ? 'flex-end' : 'flex-start';
  return (
    <View
      role="columnheader"
      {...webProps(onSort ? { 'aria-sort': direction ?? 'none' } : {})}
      style={{
        flexGrow: grow,
        flexShrink: 1,
        flexBasis: 0,
        minWidth: 0,
        paddingHorizontal: space.s,
        minHeight: 36,
        justifyContent: 'center',
      }}
    >
      {onSort ? (
        <Pressable
          role="button"
          onPress={() => onSort(nextSort(sort, id))}
          style={{ minHeight: target.control, flexDirection: 'row', alignItems: 'center', gap: space.xs, justifyContent }}
        >
          <Label>{title}</Label>
          {direction ? <Icon name={direction === 'ascending' ? 'up' : 'down'} size={16} color={colors.ink} /> : null}
        </Pressable>
      ) : (
        <View style={{ flexDirection: 'row', justifyContent }}>
          <Label>{title}</Label>
        </View>
      )}
    </View>
  );
}
