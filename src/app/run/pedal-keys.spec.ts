import { pedalAct } from './pedal-keys';

const element = (html: string): Element => {
  const box = document.createElement('div');
  box.innerHTML = html;
  return box.firstElementChild as Element;
};

describe('pedalAct', () => {
  it('takes PageDown and PageUp whatever has the focus', () => {
    expect(pedalAct('PageDown', element('<textarea></textarea>'))).toBe('primary');
    expect(pedalAct('PageUp', element('<button>7</button>'))).toBe('look-back');
  });

  it.each(['Enter', ' '])('takes %p where nothing, or only the page, has the focus', (key) => {
    expect(pedalAct(key, null)).toBe('primary');
    expect(pedalAct(key, document.body)).toBe('primary');
  });

  it.each(['<button>7</button>', '<input>', '<select></select>', '<a href="/">Bench</a>', '<p tabindex="0">text</p>'])(
    'leaves Enter to %p',
    (html) => {
      expect(pedalAct('Enter', element(html))).toBeUndefined();
    },
  );

  it('knows no other key', () => {
    expect(pedalAct('7', null)).toBeUndefined();
    expect(pedalAct('ArrowRight', null)).toBeUndefined();
  });
});
