import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { PowerStrip } from '@/shared/ui/components/PowerStrip';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

describe('PowerStrip', () => {
  it('tells the whole strip to a person who does not see it', () => {
    renderSheet(
      <PowerStrip
        title="Power at the bench"
        segments={[
          { state: 'off', seconds: 60 },
          { state: 'mains', seconds: 1200 },
        ]}
      />,
    );
    expect(screen.getByRole('img', { name: 'Power at the bench: off, not proved 60 s; mains 20 min' })).toBeTruthy();
  });

  it('says when there is nothing to draw', () => {
    renderSheet(<PowerStrip title="Power at the bench" segments={[]} />);
    expect(screen.getByRole('img', { name: 'Power at the bench: nothing recorded' })).toBeTruthy();
  });
});
