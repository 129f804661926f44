import { describe, expect, it } from 'vitest';
import { fitView, isZoomed, LEAST_SPAN, panView, showNote, zoomView } from '@/charts/axis-view';
import { pitchAxis, wholeView } from '@/charts/pitch-axis';

const whole = { low: 20, high: 100 };

describe('the view of the pitch axis', () => {
  it('when it is zoomed about a pitch, then that pitch keeps its place', () => {
    const place = (view: { low: number; high: number }) => (40 - view.low) / (view.high - view.low);
    const closer = zoomView(whole, 2, 40, whole);
    expect(closer.high - closer.low).toBe(40);
    expect(place(closer)).toBeCloseTo(place(whole));
    expect(zoomView(closer, 1 / 2, 40, whole)).toEqual(whole);
  });

  it('when it is zoomed further than an octave or wider than the whole, then it stops there', () => {
    const closest = zoomView(whole, 1000, 60, whole);
    expect(closest.high - closest.low).toBe(LEAST_SPAN);
    expect(zoomView(closest, 0.0001, 60, whole)).toEqual(whole);
  });

  it('when it is panned, then it keeps its span and stays within the whole', () => {
    expect(panView({ low: 40, high: 60 }, 12, whole)).toEqual({ low: 52, high: 72 });
    expect(panView({ low: 40, high: 60 }, 1000, whole)).toEqual({ low: 80, high: 100 });
    expect(panView({ low: 40, high: 60 }, -1000, whole)).toEqual({ low: 20, high: 40 });
  });

  it('when it is fitted to a chord, then every note is in sight; without notes it is the whole', () => {
    const view = fitView([36, 60], whole);
    expect(view).toEqual({ low: 33.5, high: 67.5 });
    expect(isZoomed(view, whole)).toBe(true);
    expect(fitView([], whole)).toEqual(whole);
    expect(isZoomed(whole, whole)).toBe(false);
  });

  it('when a note is out of sight, then the view moves to it, and not otherwise', () => {
    const view = { low: 40, high: 60 };
    expect(showNote(view, 50, whole)).toEqual(view);
    expect(showNote(view, 70, whole)).toEqual({ low: 52.5, high: 72.5 });
    expect(showNote(view, 30, whole)).toEqual({ low: 27.5, high: 47.5 });
  });

  it('when an axis has a view, then its ends stand at the ends of the pane', () => {
    const axis = pitchAxis([36], 540, 40, { low: 30, high: 80 });
    expect(axis.yOf(80)).toBe(40);
    expect(axis.yOf(30)).toBe(540);
    expect(axis.midiAt(290)).toBe(55);
    expect(pitchAxis([], 540, 40)).toMatchObject(wholeView([]));
  });
});
