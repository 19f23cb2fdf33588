import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { allByRole, byRole, textOf } from '../testing/by-role';
import { BenchSheet } from './bench-sheet';
import { coldMorning } from './cold-morning';

describe('what the bench shows', () => {
  let fixture: ComponentFixture<BenchSheet>;
  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;

  async function show(stepId: string | undefined, visitId = coldMorning.visitId): Promise<void> {
    fixture = TestBed.createComponent(BenchSheet);
    fixture.componentRef.setInput('visitId', visitId);
    fixture.componentRef.setInput('stepId', stepId);
    await fixture.whenStable();
  }

  it('are the instruments’ figures with their digits and units', async () => {
    await show('cold-enough');
    expect(allByRole(root(), 'listitem').map(textOf)).toEqual([
      'Scan tool, coolant 14 °C',
      'Thermometer, air around the car 13 °C',
    ]);
  });

  it('are codes with their status and freeze frame', async () => {
    await show('codes-before');
    expect(allByRole(root(), 'listitem').map(textOf)).toEqual([
      expect.stringMatching(/^P0068 stored\s*2,100 rpm, 78 kPa$/),
      'P0171 pending',
    ]);
  });

  it('are things seen and heard, without the fault’s name', async () => {
    await show('look');
    expect(textOf(root())).toContain('a black, hard crust');
    expect(textOf(root())).not.toContain(coldMorning.planted.fault);
  });

  it('are nothing where the scenario has nothing to show, between steps, and in another car', async () => {
    await show('dipstick-out');
    expect(root().children).toHaveLength(0);
    await show(undefined);
    expect(root().children).toHaveLength(0);
    await show('look', '0193b0a0-0009-7000-8000-00000000c009');
    expect(root().children).toHaveLength(0);
  });

  it('are laid open by a tap, and closed again by the next step', async () => {
    await show('look');
    const opener = (): HTMLElement => byRole(root(), 'button', 'The bench shows');
    opener().click();
    await fixture.whenStable();
    expect(opener().getAttribute('aria-expanded')).toBe('true');
    fixture.componentRef.setInput('stepId', 'codes-after');
    await fixture.whenStable();
    expect(opener().getAttribute('aria-expanded')).toBe('false');
  });
});
