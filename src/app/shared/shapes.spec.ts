import { type Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { AirPath } from './air-path';
import { BandGauge } from './band-gauge';
import { CautionPanel } from './caution-panel';
import { ResultMark } from './result-mark';
import { RouteRibbon } from './route-ribbon';
import { SyncChip } from './sync-chip';
import { nothingWaiting } from '../core/sync-view';

async function shown(component: Type<unknown>, inputs: Record<string, unknown>): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(component);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

const nameOf = (element: HTMLElement): string | null =>
  element.querySelector('[role="img"]')?.getAttribute('aria-label') ?? null;

describe('BandGauge', () => {
  const band = { low: 91.9, high: 95.9, lowText: '91.9', highText: '95.9', unit: 'kPa' };

  it('says reading, result and band, and writes both ends with the unit once', async () => {
    const gauge = await shown(BandGauge, { ...band, value: 94.2, valueText: '94.2', uncertainty: 0.6, result: 'in' });
    expect(nameOf(gauge)).toBe('94.2 kPa, in band, band from 91.9 to 95.9 kPa');
    expect([...gauge.querySelectorAll('text')].map((text) => text.textContent)).toEqual(['91.9', '95.9 kPa']);
  });

  it('says that there is no reading yet', async () => {
    expect(nameOf(await shown(BandGauge, band))).toBe('no reading yet, band from 91.9 to 95.9 kPa');
  });

  it('writes a band with one end in words', async () => {
    const gauge = await shown(BandGauge, { high: 1.5, highText: '1.5', unit: 'kPa', value: 2, result: 'out' });
    expect(nameOf(gauge)).toBe('2 kPa, out of band, up to 1.5 kPa');
  });
});

describe('ResultMark', () => {
  it.each([
    ['in', 'in band', 'circle', 'path'],
    ['out', 'out of band', 'rect', 'path'],
    ['too-close', 'too close to call', 'circle', 'path'],
    ['not-judged', 'not judged', 'path'],
  ])('shows %s as words and as a shape of its own', async (result, words, ...shapes) => {
    const mark = await shown(ResultMark, { result });
    expect(nameOf(mark)).toBe(words);
    expect([...mark.querySelectorAll('g > *')].map((shape) => shape.localName)).toEqual(shapes);
  });

  it('is silent where the words stand beside it', async () => {
    const mark = await shown(ResultMark, { result: 'in', isSilent: true });
    expect(nameOf(mark)).toBeNull();
  });
});

describe('RouteRibbon', () => {
  it('reads out that a finding judged nothing', async () => {
    const route = await shown(RouteRibbon, { walked: [{ label: 'F12', result: 'not-judged' }] });
    expect(route.querySelector('li')?.textContent?.trim()).toBe('F12not judged');
  });

  const walked = [{ label: '4', result: 'in' }, { label: '5' }, { label: '6', result: 'not-measured' }];

  it('lists the walked steps with their results, then the current one, then every way on', async () => {
    const route = await shown(RouteRibbon, {
      walked,
      live: '7',
      ahead: [
        { label: '8, boost', isMain: true },
        { label: 'sensor reads off', isMain: false },
      ],
    });
    expect([...route.querySelectorAll('li')].map((bead) => bead.textContent?.trim())).toEqual([
      '4in band',
      '5done',
      '6not measured',
    ]);
    expect(route.textContent).toContain('now at step 7');
    expect(route.textContent).toContain('next: 8, boost; or: sensor reads off');
  });

  it('counts the ways that it has no room to name', async () => {
    const ahead = ['8', '9', '10'].map((label, index) => ({ label, isMain: index === 0 }));
    const route = await shown(RouteRibbon, { walked: [], live: '7', ahead });
    expect(route.querySelector('.other')?.textContent).toBe('or: 9, and 1 more');
  });
});

describe('CautionPanel', () => {
  it.each([
    ['danger', 'DANGER', true],
    ['warning', 'WARNING', true],
    ['caution', 'CAUTION', true],
    ['notice', 'NOTICE', false],
  ])(
    'gives %s its signal word, and a triangle only where someone may be hurt',
    async (word, shownWord, hasTriangle) => {
      const panel = await shown(CautionPanel, { word, text: 'Keep your face out of line with it.' });
      expect(panel.querySelector('[role="note"]')?.textContent?.replace(/\s+/g, ' ').trim()).toBe(
        `${shownWord} Keep your face out of line with it.`,
      );
      expect(panel.querySelector('svg') !== null).toBe(hasTriangle);
    },
  );
});

describe('AirPath', () => {
  it('says what is marked, in the words of the step where it has some', async () => {
    const sheet = await shown(AirPath, {
      marks: ['probe', 'manifold-valve'],
      labels: { probe: 'probe: intake hose' },
    });
    expect(nameOf(sheet)).toBe('Air path of a turbo engine, marked: crankcase valve, probe: intake hose');
    expect(sheet.querySelectorAll('.on')).toHaveLength(2);
  });
});

describe('SyncChip', () => {
  it('is a status, so that a change is spoken', async () => {
    const view = {
      isReached: true,
      unreachedSince: undefined,
      lastSyncAt: undefined,
      waiting: nothingWaiting,
      progress: { done: 3, of: 12 },
      heldUpBy: undefined,
    };
    const chip = await shown(SyncChip, { view });
    expect(chip.getAttribute('role')).toBe('status');
    expect(chip.textContent?.trim()).toBe('Synced 3 of 12');
  });
});
