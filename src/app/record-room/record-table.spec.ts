import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { allByRole, byRole, textOf } from '../shared/testing/by-role';
import { RecordTable } from './record-table';
import type { RecordRow } from './record-wire';

const rows: RecordRow[] = Array.from({ length: 200 }, (_, index) => ({
  runId: `run-${index}`,
  procedureTitle: 'Crankcase valve seal',
  version: 4,
  repairOrder: String(4400 + index),
  car: 'Merrow Heron',
  person: 'I. Okafor',
  openedAt: new Date(2026, 11, 2, 9, 2).getTime(),
  status: index === 1 ? 'set-aside' : 'closed',
  half: index % 2 === 0 ? 'cold' : 'warm',
  ...(index === 0 ? { result: 'out' as const, verdict: 'The manifold valve does not seal.' } : {}),
}));

describe('the table of records', () => {
  let fixture: ComponentFixture<RecordTable>;
  let opened: string[];

  beforeEach(async () => {
    // jsdom lays nothing out: the list believes that it is ten rows high.
    jest.spyOn(HTMLElement.prototype, 'clientHeight', 'get').mockReturnValue(600);
    HTMLElement.prototype.scrollTo = jest.fn();
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    fixture = TestBed.createComponent(RecordTable);
    fixture.componentRef.setInput('rows', rows);
    fixture.componentRef.setInput('question', 1);
    fixture.componentRef.setInput('sort', '-openedAt');
    opened = [];
    fixture.componentInstance.openRow.subscribe((runId) => opened.push(runId));
    await fixture.whenStable();
    // The viewport renders its rows one frame later.
    await new Promise((resolve) => requestAnimationFrame(resolve));
    await fixture.whenStable();
  });
  afterEach(() => jest.restoreAllMocks());

  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const list = (): HTMLElement => byRole(root(), 'grid');
  async function press(...keys: string[]): Promise<void> {
    for (const key of keys)
      list().dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
    await fixture.whenStable();
  }

  it('has only the rows in sight in the page, and says how many there are', () => {
    expect(byRole(root(), 'grid').getAttribute('aria-rowcount')).toBe('201');
    expect(allByRole(root(), 'row').length).toBeLessThan(60);
  });

  it('says a finding with its shape’s words and its verdict, and an open run’s status', () => {
    const [, first, second] = allByRole(root(), 'row');
    expect(textOf(first!)).toContain('out of band The manifold valve does not seal.');
    expect(textOf(first!)).toMatch(/2 Dec 2026\s*9:02/);
    expect(textOf(second!)).toContain('set aside');
  });

  it('tells the halves of a pair apart, and a run that is not closed from one that is', () => {
    const [, first, second] = allByRole(root(), 'row');
    expect(textOf(first!)).toMatch(/4400\s*cold half/);
    expect(textOf(second!)).toMatch(/4401\s*warm half/);
    expect([first, second].map((row) => row!.querySelector('.state .open')?.textContent)).toEqual([
      undefined,
      'set aside',
    ]);
    expect(textOf(first!)).toContain('closed');
  });

  it('is walked by arrows and opens the current row by Enter', async () => {
    expect(list().getAttribute('aria-activedescendant')).toBe('record-row-0');
    await press('ArrowDown', 'ArrowDown', 'ArrowUp', 'Enter');
    expect(list().getAttribute('aria-activedescendant')).toBe('record-row-1');
    expect(opened).toEqual(['run-1']);
  });

  it('goes to the last and back to the first by End and Home', async () => {
    await press('End');
    expect(list().getAttribute('aria-activedescendant')).toBe('record-row-199');
    await press('Home');
    expect(list().getAttribute('aria-activedescendant')).toBe('record-row-0');
  });

  it('sorts by the column that is pressed, and turns round at the second press', async () => {
    const sorts: string[] = [];
    fixture.componentInstance.sortChange.subscribe((sort) => sorts.push(sort));
    byRole(root(), 'button', 'Car').click();
    byRole(root(), 'button', 'Opened').click();
    fixture.componentRef.setInput('sort', 'car');
    await fixture.whenStable();
    byRole(root(), 'button', 'Car').click();
    expect(sorts).toEqual(['car', 'openedAt', '-car']);
    expect(byRole(root(), 'columnheader', 'Car').getAttribute('aria-sort')).toBe('ascending');
  });

  it('leaves the keys of a column’s button to the button', async () => {
    const button = byRole(root(), 'button', 'Car');
    button.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter', bubbles: true, cancelable: true }));
    await fixture.whenStable();
    expect(opened).toEqual([]);
  });

  it('starts from the top again with a new question, not with a page that comes', async () => {
    await press('ArrowDown');
    fixture.componentRef.setInput('rows', [...rows]);
    await fixture.whenStable();
    expect(list().getAttribute('aria-activedescendant')).toBe('record-row-1');
    fixture.componentRef.setInput('question', 2);
    await fixture.whenStable();
    expect(list().getAttribute('aria-activedescendant')).toBe('record-row-0');
  });
});
