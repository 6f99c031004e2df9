import { AxiosError, AxiosHeaders } from 'axios';
import { ApiProblem, toApiProblem } from './api-problem';

function answered(status: number, data: unknown): AxiosError {
  const config = { headers: new AxiosHeaders() };
  return new AxiosError('refused', undefined, config, null, {
    status,
    data,
    statusText: '',
    headers: {},
    config,
  });
}

test('a problem document keeps its code, detail and the faults at their fields', () => {
  const problem = toApiProblem(
    answered(422, {
      status: 422,
      code: 'invalid-body',
      title: 'Something does not fit',
      detail: 'See the fields.',
      errors: [
        { pointer: '/email', message: 'Give an e-mail address.' },
        { pointer: '/window/youngKa', field: 'window.youngKa', message: 'Younger than old.' },
      ],
    }),
  );
  expect(problem.code).toBe('invalid-body');
  expect(problem.at('email')).toBe('Give an e-mail address.');
  expect(problem.at('window.youngKa')).toBe('Younger than old.');
  expect(problem.at('name')).toBeUndefined();
  expect(problem.besides(['email']).map((fault) => fault.message)).toEqual(['Younger than old.']);
});

test('a domain error with one field puts its detail at that field', () => {
  const problem = toApiProblem(
    answered(422, { code: 'outside-range', detail: 'latitude is 91 °.', field: 'latitude' }),
  );
  expect(problem.at('latitude')).toBe('latitude is 91 °.');
});

test('no answer says that what was entered is kept', () => {
  const problem = toApiProblem(new AxiosError('Network Error', 'ERR_NETWORK'));
  expect(problem.status).toBe(0);
  expect(problem.code).toBe('no-answer');
  expect(problem.detail).toMatch(/still here/);
});

test('an answer that is no problem document still gets a code and a remedy', () => {
  const problem = toApiProblem(answered(502, '<html>bad gateway</html>'));
  expect(problem.code).toBe('http-502');
  expect(problem.detail).toMatch(/Try again/);
});

test('a problem stays the problem it is', () => {
  const problem = new ApiProblem(403, 'not-allowed', 'Not allowed', 'Your roles do not allow it.');
  expect(toApiProblem(problem)).toBe(problem);
});
