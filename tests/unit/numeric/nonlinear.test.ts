import { describe, expect, it } from 'vitest';
import { gaussNewton, type Vector } from '@/lib/numeric';

const xs = [0, 1, 2, 3, 4, 5];
const decay = ([a, k]: Vector) => ({
  values: xs.map((x) => a! * Math.exp(-k! * x)),
  jacobian: xs.map((x) => [Math.exp(-k! * x), -a! * x * Math.exp(-k! * x)]),
});

describe('gaussNewton', () => {
  it('finds the parameters of an exact decay from a poor start', () => {
    const fit = gaussNewton({ start: [1, 0.01], y: decay([7, 0.4]).values, model: decay });
    expect(fit.status).toBe('converged');
    expect(fit.parameters[0]).toBeCloseTo(7, 8);
    expect(fit.parameters[1]).toBeCloseTo(0.4, 8);
  });

  it('takes no step when it starts at the solution', () => {
    expect(gaussNewton({ start: [7, 0.4], y: decay([7, 0.4]).values, model: decay })).toMatchObject({ status: 'converged', iterations: 0 });
  });

  it('weighs the observations', () => {
    const y = decay([7, 0.4]).values.map((value, i) => (i === 5 ? value + 3 : value));
    const fit = gaussNewton({ start: [5, 0.3], y, model: decay, weights: [1, 1, 1, 1, 1, 1e-12] });
    expect(fit.parameters[0]).toBeCloseTo(7, 6);
  });

  it('says that the model is not defined at the start', () => {
    expect(gaussNewton({ start: [1, 1], y: xs, model: () => null })).toMatchObject({ status: 'undefinedStart', linear: null });
  });

  it('steps back from where the model is not defined', () => {
    const root = ([a]: Vector) => (a! > 0 ? { values: [Math.sqrt(a!)], jacobian: [[0.5 / Math.sqrt(a!)]] } : null);
    const fit = gaussNewton({ start: [100], y: [0.1], model: root });
    expect(fit.status).toBe('converged');
    expect(fit.parameters[0]).toBeCloseTo(0.01, 9);
  });

  it('says that the step limit was reached', () => {
    expect(gaussNewton({ start: [1, 0.01], y: decay([7, 0.4]).values, model: decay, maxIterations: 1 }).status).toBe('iterationLimit');
  });

  it('tells the rank where two parameters only act together', () => {
    const product = ([a, b]: Vector) => ({ values: xs.map((x) => a! * b! * x), jacobian: xs.map((x) => [b! * x, a! * x]) });
    const fit = gaussNewton({ start: [1, 1], y: xs.map((x) => 6 * x), model: product });
    expect(fit.linear).toMatchObject({ status: 'rankDeficient', rank: 1 });
    expect(fit.status).toBe('stalled');
  });
});
