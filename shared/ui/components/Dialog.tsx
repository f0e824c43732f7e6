/** A question that must be answered before the page goes on. */
import { useEffect, useId, useRef } from 'react';
import type { ReactNode } from 'react';
import { createPortal } from 'react-dom';
import { ScrollView, View } from 'react-native';

import { tabStops, wrapTab } from '@/shared/ui/components/focusTrap';
import { Heading } from '@/shared/ui/components/Heading';
import { line, space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webProps, webStyle } from '@/shared/ui/theme/webStyle';

interface Props {
  title: string;
  children: ReactNode;
  /** its answers, in reading order */
  actions: ReactNode;
  /** called by Escape; without it the dialog can only be answered */
  onClose?: (() => void) | undefined;
  /** stays in reach below the dialog and inside its focus: the `StopBar` of a run */
  foot?: ReactNode;
}

interface TabLike {
  key: string;
  shiftKey: boolean;
  preventDefault: () => void;
  stopPropagation: () => void;
}

/** Mount it to open it. Focus moves in, is kept in, and goes back to where it was when it is unmounted. */
export function Dialog({ title, children, actions, onClose, foot }: Props) {
  const { colors } = useTheme();
  const id = useId();
  const layer = useRef<View>(null);
  const box = useRef<View>(null);
  useEffect(() => {
    const before = document.activeElement;
    // the box itself takes the focus: a reader starts at the title, and no answer is one key away by accident
    (box.current as unknown as HTMLElement | null)?.focus();
    return () => {
      if (before instanceof HTMLElement) before.focus();
    };
  }, []);
  // caught on the way down: a text field keeps its keys to itself on the way up
  const onKeyDownCapture = (e: TabLike) => {
    if (e.key === 'Escape' && onClose) {
      e.stopPropagation();
      onClose();
      return;
    }
    const element = layer.current as unknown as HTMLElement | null;
    if (e.key !== 'Tab' || !element) return;
    const next = wrapTab(tabStops(element), document.activeElement as HTMLElement | null, e.shiftKey);
    if (!next) return;
    e.preventDefault();
    next.focus();
  };
  return createPortal(
    <View
      ref={layer}
      {...webProps({ onKeyDownCapture })}
      style={webStyle({ position: 'fixed', top: 0, right: 0, bottom: 0, left: 0, zIndex: 100, backgroundColor: colors.scrim })}
    >
      <View style={{ flex: 1, minHeight: 0, padding: space.l, justifyContent: 'center', alignItems: 'center' }}>
        <View
          ref={box}
          role="dialog"
          aria-modal
          aria-labelledby={`${id}t`}
          tabIndex={-1}
          style={{
            width: '100%',
            maxWidth: 560,
            maxHeight: '100%',
            backgroundColor: colors.paper,
            borderWidth: line.heavy,
            borderColor: colors.ink,
          }}
        >
          <View style={{ padding: space.l, paddingRight: space.xxl, borderBottomWidth: line.rule, borderBottomColor: colors.ink }}>
            <Heading level={2} id={`${id}t`}>
              {title}
            </Heading>
          </View>
          <ScrollView style={{ flexShrink: 1 }} contentContainerStyle={{ padding: space.l, gap: space.l }}>
            {children}
          </ScrollView>
          <View
            style={{
              flexDirection: 'row',
              flexWrap: 'wrap',
              justifyContent: 'flex-end',
              gap: target.gap,
              padding: space.l,
              paddingTop: space.s,
            }}
          >
            {actions}
          </View>
        </View>
      </View>
      {foot}
    </View>,
    document.body,
  );
}
