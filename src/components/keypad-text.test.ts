import { describe, expect, it } from 'vitest';
import { keyOfKeyboard, shownText, typeKey, typeSecretKey } from './keypad-text';

describe('typing a figure', () => {
  it('keeps one point and no zeros in front', () => {
    expect(typeKey(typeKey('0', '5'), '.')).toBe('5.');
    expect(typeKey('1.0', '.')).toBe('1.0');
    expect(typeKey('', '.')).toBe('0.');
  });

  it('turns the sign around and erases it with the last figure', () => {
    expect(typeKey('4', '-')).toBe('-4');
    expect(typeKey('-4', '-')).toBe('4');
    expect(typeKey('-4', 'erase')).toBe('');
  });

  it('shows a true minus and the reader’s decimal sign', () => {
    expect(shownText('-0.05', ',')).toBe('\u22120,05');
  });

  it('takes a comma of a hardware keyboard for the point', () => {
    expect(keyOfKeyboard(',')).toBe('.');
    expect(keyOfKeyboard('a')).toBeNull();
  });
});

describe('typing a PIN', () => {
  it('keeps zeros in front and takes twelve digits, no more', () => {
    expect(typeSecretKey(typeSecretKey('', '0'), '7')).toBe('07');
    expect(typeSecretKey('012345678901', '2')).toBe('012345678901');
    expect(typeSecretKey('07', '.')).toBe('07');
    expect(typeSecretKey('07', 'erase')).toBe('0');
  });
});
