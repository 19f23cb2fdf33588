import { fetchPart } from './fetch-part';

const gaveUp = new TypeError('Failed to fetch dynamically imported module: chunk.js');

describe('a part of the app that is fetched when it is needed', () => {
  /** Fails so often, then gives the part. */
  const failing = (times: number): jest.Mock<Promise<string>> => {
    const load = jest.fn<Promise<string>, []>();
    for (let count = 0; count < times; count += 1) load.mockRejectedValueOnce(gaveUp);
    return load.mockResolvedValue('the part');
  };
  const waited: number[] = [];
  const wait = (ms: number): Promise<void> => {
    waited.push(ms);
    return Promise.resolve();
  };
  beforeEach(() => waited.splice(0));

  it('is asked for once where it comes', async () => {
    const load = failing(0);
    expect(await fetchPart(load, wait)).toBe('the part');
    expect([load.mock.calls.length, waited]).toEqual([1, []]);
  });

  it('is asked for again where the browser gave up, a little later each time', async () => {
    const load = failing(2);
    expect(await fetchPart(load, wait)).toBe('the part');
    expect([load.mock.calls.length, waited]).toEqual([3, [200, 1_000]]);
  });

  it('is given up after the third time, with what the browser said', async () => {
    const load = failing(3);
    await expect(fetchPart(load, wait)).rejects.toBe(gaveUp);
    expect(load).toHaveBeenCalledTimes(3);
  });
});
