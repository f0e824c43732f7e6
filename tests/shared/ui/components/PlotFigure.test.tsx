import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { PlotFigure } from '@/shared/ui/components/PlotFigure';
import type { Plot } from '@/shared/workings/plot';
import { sampleCurve } from '@/shared/workings/plot';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

const plot: Plot = {
  title: 'Volts left over time',
  x: { title: 'Time', unit: 's', scale: 'linear' },
  y: { title: 'Volts left', unit: 'V', scale: 'linear' },
  curves: [
    { label: 'at the marked value', role: 'main', points: sampleCurve((t) => 300 * Math.exp(-t / 10), 0, 60) },
    { label: 'at worst', role: 'bound', points: sampleCurve((t) => 300 * Math.exp(-t / 15), 0, 60) },
  ],
  points: [{ label: 'safe to touch', role: 'answer', x: 41, y: 5 }],
  bands: [{ label: 'safe', axis: 'y', from: null, to: 5, role: 'good' }],
  limits: [{ label: 'dead limit', axis: 'y', at: 5 }],
  words: 'Volts fall from 300 V and pass 5 V after 41 s.',
};

describe('PlotFigure', () => {
  it('is told in words, which also stand on the page', () => {
    renderSheet(<PlotFigure plot={plot} />);
    const image = screen.getByRole('img', { name: 'Volts left over time' });
    const words = document.getElementById(image.getAttribute('aria-describedby') ?? '');
    expect(words?.textContent).toBe('Volts fall from 300 V and pass 5 V after 41 s.');
  });

  it('says in its key what each line and each number is, with units', () => {
    renderSheet(<PlotFigure plot={plot} />);
    const key = within(screen.getByRole('list', { name: 'Key of Volts left over time' }));
    expect(key.getAllByRole('listitem').map((item) => item.textContent)).toEqual([
      '1safe to touch: 41 s; 5 V',
      'at the marked value',
      'at worst',
      'dead limit: 5 V',
      'safe',
    ]);
  });

  it('names both axes with their units, and numbers its points', () => {
    const { container } = renderSheet(<PlotFigure plot={plot} />);
    const drawn = [...container.querySelectorAll('svg text')].map((text) => text.textContent);
    expect(drawn).toEqual(expect.arrayContaining(['Volts left, V', 'Time, s', '100', '1']));
  });

  it('draws each curve once, the main one whole and the bound one dotted', () => {
    const { container } = renderSheet(<PlotFigure plot={plot} />);
    const curves = [...container.querySelectorAll('svg path[fill="none"]')];
    expect(curves.map((curve) => curve.getAttribute('stroke-dasharray'))).toEqual(['2 4', 'none']);
  });
});
