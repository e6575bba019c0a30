import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { AskPolicy } from '../../web/state/ask-policy';
import { beginHistory, record, redone, undone } from '../../web/state/history';
import { niceTicks, pumpAxis } from '../../web/state/pump-axis';
import { profileText, readProfile } from '../../web/state/profile-text';
import { steppedText } from '../../web/state/step-text';

describe('stepping the number of a quantity', () => {
  test.each([
    ['12 W', 1, '13 W'],
    ['12 W', -10, '2 W'],
    ['260 um', 1, '270 um'],
    ['0.28 nm/K', 1, '0.29 nm/K'],
    ['4.5 cm^-1', 1, '4.6 cm^-1'],
    ['22 degC', 1, '23 degC'],
    ['0.9 W/(cm^2 K)', -1, '0.89 W/(cm^2 K)'],
    ['-5 degC', 1, '-4 degC'],
    ['9.9 mm', 1, '10 mm'],
  ])('%s moved by %i is %s', (text, steps, expected) => {
    expect(steppedText(text, steps)).toBe(expected);
  });

  test('a count moves by one', () => expect(steppedText('127', 1, true)).toBe('128'));
  test('a word has no next one', () => expect(steppedText('flat', 1)).toBeNull());
});

describe('history', () => {
  test('steps of one gesture are undone together, others one by one', () => {
    let history = beginHistory('a');
    history = record(history, 'b', 'Pump power', 'power', 100);
    history = record(history, 'c', 'Pump power', 'power', 300);
    history = record(history, 'd', 'Length', 'length', 400);
    expect(undone(history).present.state).toBe('c');
    expect(undone(undone(history)).present.state).toBe('a');
    expect(redone(undone(history)).present.state).toBe('d');
  });

  test('the same field changed again after a rest is a step of its own', () => {
    let history = record(beginHistory('a'), 'b', 'Pump power', 'power', 0);
    history = record(history, 'c', 'Pump power', 'power', 5000);
    expect(undone(history).present.state).toBe('b');
  });

  test('at either end there is nothing to undo or redo', () => {
    expect(undone(beginHistory('a')).present.state).toBe('a');
    expect(redone(beginHistory('a')).present.state).toBe('a');
  });
});

describe('when the solver is asked', () => {
  beforeEach(() => void vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout', 'performance'] }));
  afterEach(() => void vi.useRealTimers());

  test('typing is answered once it rests', () => {
    const ask = vi.fn();
    const policy = new AskPolicy(ask);
    for (let letter = 0; letter < 5; letter += 1) {
      policy.changed();
      vi.advanceTimersByTime(20);
    }
    expect(ask).not.toHaveBeenCalled();
    vi.advanceTimersByTime(60);
    expect(ask).toHaveBeenCalledTimes(1);
  });

  test('a drag asks one question at a time and the last position is always answered', () => {
    const ask = vi.fn();
    const policy = new AskPolicy(ask);
    policy.changedByDrag();
    policy.changedByDrag();
    policy.changedByDrag();
    expect(ask).toHaveBeenCalledTimes(1);
    policy.answered();
    expect(ask).toHaveBeenCalledTimes(2);
    policy.answered();
    expect(ask).toHaveBeenCalledTimes(2);
  });

  test('an answer that takes too long does not hold a newer design up', () => {
    const ask = vi.fn();
    const policy = new AskPolicy(ask);
    policy.send();
    policy.changed();
    vi.advanceTimersByTime(60);
    expect(ask).toHaveBeenCalledTimes(1);
    vi.advanceTimersByTime(2000);
    expect(ask).toHaveBeenCalledTimes(2);
  });
});

describe('the pump axis', () => {
  test('ticks are round and cover the span', () => {
    expect(niceTicks(0, 30, 8)).toEqual([0, 5, 10, 15, 20, 25, 30]);
    expect(niceTicks(0, 0, 8)).toEqual([]);
  });

  test('no place lies outside the drawing', () => {
    const axis = pumpAxis(20);
    expect([axis.at(-5), axis.at(10), axis.at(50)]).toEqual([0, 50, 100]);
  });
});

describe('a measured profile typed or pasted', () => {
  test.each([
    [
      '0 um, 1\n50 um, 0.9',
      [
        ['0 um', 1],
        ['50 um', 0.9],
      ],
    ],
    [
      '0;1\n0.05 mm;9e-1\n\n',
      [
        ['0 um', 1],
        ['0.05 mm', 0.9],
      ],
    ],
    [
      '0\t1\n50\t0.9',
      [
        ['0 um', 1],
        ['50 um', 0.9],
      ],
    ],
    [
      '0 1\n50 um 0.9',
      [
        ['0 um', 1],
        ['50 um', 0.9],
      ],
    ],
  ])('%j is read as pairs', (text, pairs) => expect(readProfile(text)).toEqual(pairs));

  test('what is no number is left for the check to name, and nothing at all is no table', () => {
    expect(readProfile('0 um, bright')).toEqual([['0 um', 'bright']]);
    expect(readProfile('50 um')).toEqual([['50 um', 'um']]);
    expect(readProfile(' \n')).toBeUndefined();
  });

  test('is shown as it is read', () => {
    const points: [string, number][] = [
      ['0 um', 1],
      ['0.3 mm', 0],
    ];
    expect(readProfile(profileText(points))).toEqual(points);
  });
});
