import { isUnavailable } from './unavailable';

const failure = (fields: object): Error => Object.assign(new Error('x'), fields);

describe('whether the database can not serve at the moment', () => {
  it.each([
    ['no answer at its port', failure({ code: 'ECONNREFUSED' })],
    ['no answer at any of its addresses', failure({ errors: [failure({ code: 'ECONNREFUSED' })] })],
    ['it is being shut down', failure({ code: '57P01' })],
    ['it is starting', failure({ driverError: failure({ code: '57P03' }) })],
    ['a deadlock, of which one had to go', failure({ driverError: failure({ code: '40P01' }) })],
    ['a connection that broke', new Error('Connection terminated unexpectedly')],
  ])('is so: %s', (_name, error) => expect(isUnavailable(error)).toBe(true));

  it.each([
    ['a row that is there already', failure({ code: '23505' })],
    ['a statement that is wrong', failure({ driverError: failure({ code: '42601' }) })],
    ['a slip in the program', new TypeError('x is undefined')],
    ['nothing', undefined],
  ])('is not so: %s', (_name, error) => expect(isUnavailable(error)).toBe(false));
});
