import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { envelope } from './extremes';
import { scanFigure } from './figure-scan';
import { pulseFigures, ringAfter, ringInductance } from './measure';
import { readOscillogram, type Oscillogram } from './read-oscillogram';

const bytes = (text: string) => new TextEncoder().encode(text);

function read(text: string): Oscillogram {
  const result = readOscillogram(bytes(text));
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

const shape = (file: Oscillogram) => ({
  time: [...file.time.seconds],
  channels: file.channels.map(({ name, unit, values }) => ({ name, unit, values: [...values] })),
});

describe('reading an oscilloscope table', () => {
  it('reads time and two channels under one header line', () => {
    expect(shape(read('Time (s),CH1 (V),CH2 (mV)\n-1e-9,0.5,20\n0,1.5,-3\n1e-9,2.5,4\n'))).toEqual({
      time: [-1e-9, 0, 1e-9],
      channels: [
        { name: 'CH1', unit: 'V', values: [0.5, 1.5, 2.5] },
        { name: 'CH2', unit: 'mV', values: [20, -3, 4] },
      ],
    });
  });

  it('reads semicolons with decimal commas and time in microseconds', () => {
    const file = read('Zeit [us];Kanal A [kV]\r\n0,5;1,25\r\n0,6;-1,5\r\n0,7;2\r\n');
    expect(shape(file)).toEqual({
      time: [0.5 * 1e-6, 0.6 * 1e-6, 0.7 * 1e-6],
      channels: [{ name: 'Kanal A', unit: 'kV', values: [1.25, -1.5, 2] }],
    });
  });

  it('finds time in whatever column it stands', () => {
    const file = read('CH1,CH2,Time\nV,V,ns\n3,1,0\n2,9,10\n1,-4,20\n0,2,30\n');
    expect(file.time).toMatchObject({ type: 'column', column: 2 });
    expect([...file.time.seconds]).toEqual([0, 10, 20, 30].map((ns) => ns * 1e-9));
    expect(file.channels.map(({ name, unit }) => [name, unit])).toEqual([
      ['CH1', 'V'],
      ['CH2', 'V'],
    ]);
  });

  it('passes a header of a dozen lines with figures in it', () => {
    const header = Array.from({ length: 12 }, (_, i) => `Setting ${String(i)},${String(i * 2)}`).join('\n');
    const file = read(`${header}\nTIME,CH1\n0.0,1\n0.1,2\n0.2,4\n`);
    expect(file.points).toBe(3);
    expect(shape(file).channels).toEqual([{ name: 'CH1', unit: '', values: [1, 2, 4] }]);
    expect(file.time.words).toContain('seconds are assumed');
  });

  it('reads a table that stands beside its own header', () => {
    const rows = Array.from({ length: 8 }, (_, i) => `,,,${(i * 1e-9).toExponential()},${String(i)}`);
    rows[0] = `Points,8,,0,0`;
    rows[1] = `Vertical units,V,,1e-9,1`;
    expect([...read(rows.join('\n')).channels[0]!.values]).toEqual([0, 1, 2, 3, 4, 5, 6, 7]);
  });

  it('takes the interval of the header where no column is time', () => {
    const file = read('Sample Interval,2.0e-9,s\nCH1,CH2\n3,1\n2,9\n1,-4\n0,2\n');
    expect(file.time).toMatchObject({ type: 'interval', column: null });
    expect([...file.time.seconds].map((time) => Math.round(time * 1e12))).toEqual([0, 2000, 4000, 6000]);
    expect(file.channels).toHaveLength(2);
  });

  it('asks for the interval where nothing gives one', () => {
    const file = read('CH1\n3\n2\n5\n');
    expect(file.time).toMatchObject({
      type: 'none',
      words: 'The file has no time: enter the time between two points.',
    });
  });

  it('reads blanks, tabs, quotation marks, lone returns, UTF-16 and a one-byte micro sign', () => {
    expect(shape(read('t/s  U/V\n 0.0   1.0\n 0.1  -2.5\n')).channels[0]!.values).toEqual([1, -2.5]);
    expect(shape(read('t\tU\n0,0\t1,0\n0,1\t-2,5\n')).channels[0]!.values).toEqual([1, -2.5]);
    expect(shape(read('"Time (s)","CH1 (V)"\n"0.0","1.0"\n"0.1","-2.5"\n')).channels[0]!.values).toEqual([
      1, -2.5,
    ]);
    expect(shape(read('t,U\r0,1\r1,2\r')).channels[0]!.values).toEqual([1, 2]);
    const text = 'Time (\u00b5s),CH1 (V)\n0,1\n1,2\n';
    const wide = new Uint8Array(2 + text.length * 2);
    wide.set([0xff, 0xfe]);
    [...text].forEach((letter, i) =>
      wide.set([letter.charCodeAt(0) & 0xff, letter.charCodeAt(0) >> 8], 2 + i * 2),
    );
    const latin = Uint8Array.from(text, (letter) => letter.charCodeAt(0));
    for (const file of [wide, latin, bytes(text)]) {
      const result = readOscillogram(file);
      expect(result.ok && [...result.value.time.seconds]).toEqual([0, 1e-6]);
    }
  });

  it('names the lines that it leaves out and counts what left the screen', () => {
    const file = read('t,U\n0,1\n1,2\n2,broken\n3,4\n4,9.9e37\n5,6\n\n6,7\n');
    expect(shape(file).channels[0]!.values).toEqual([1, 2, 4, 6, 7]);
    expect(file.skipped).toEqual({ count: 1, lines: [4] });
    expect(file.overrange).toBe(1);
  });

  it.each([
    ['', 'The file is empty.'],
    ['hello\nworld\n', 'No table of figures'],
    ['\u0000\u0001\u0002\u0000', 'no text table'],
    ['t,U\n1,2\n', 'No table of figures'],
  ])('refuses %j in words', (text, words) => {
    const result = readOscillogram(bytes(text));
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.refusal.words).toContain(words);
  });

  it('never throws on any bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), (file) => {
        readOscillogram(file);
      }),
      { numRuns: 500 },
    );
    fc.assert(
      fc.property(
        fc.string({ unit: fc.constantFrom(...'0123456789.,;-+eE\t \n\r"xV()'), maxLength: 300 }),
        (text) => {
          readOscillogram(bytes(text));
        },
      ),
      { numRuns: 1000 },
    );
  });

  it('reads back every table that it is given, whatever its separator and decimal sign', () => {
    const value = fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e9, max: 1e9 });
    const table = fc.array(fc.tuple(value, value), { minLength: 3, maxLength: 30 });
    const marks = fc.constantFrom([',', '.'], [';', '.'], [';', ','], ['\t', ','], ['\t', '.']);
    fc.assert(
      fc.property(table, marks, (rows, [separator = ',', decimal = '.']) => {
        const figure = (x: number) => String(x).replace('.', decimal);
        const lines = rows.map(([a, b], i) => [String(i), figure(a), figure(b)].join(separator));
        const file = read(`time${separator}A${separator}B\n${lines.join('\n')}\n`);
        expect(file.points).toBe(rows.length);
        rows.forEach(([a, b], i) => {
          expect(file.channels[0]!.values[i]! - a).toBeCloseTo(0, 5);
          expect(file.channels[1]!.values[i]).toBe(b === 0 ? file.channels[1]!.values[i] : b);
        });
      }),
      { numRuns: 300 },
    );
  });
});

describe('scanning a figure', () => {
  it('gives the double that the language gives', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const text = String(value);
        const scan = { bytes: bytes(text), at: 0 };
        expect(scanFigure(scan, scan.bytes.length, 46)).toBe(
          value === 0 ? scanFigure({ ...scan, at: 0 }, text.length, 46) : value,
        );
        expect(scan.at).toBe(text.length);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('envelope of a trace', () => {
  it('keeps a spike of a single point among a million', () => {
    const count = 1_000_000;
    const seconds = Float64Array.from({ length: count }, (_, i) => i * 1e-12);
    const values = new Float64Array(count);
    values[654_321] = 30_000;
    values[123] = -7;
    const { low, high } = envelope({ seconds, values }, { from_s: 0, to_s: (count - 1) * 1e-12 }, 800);
    expect(Math.max(...high)).toBe(30_000);
    expect(Math.min(...low)).toBe(-7);
    expect(high.filter((value) => value > 0)).toHaveLength(1);
  });

  it('holds the extremes of the points in its window for any trace', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1e3, max: 1e3, noNaN: true }), { minLength: 2, maxLength: 200 }),
        (list) => {
          const values = Float64Array.from(list);
          const seconds = Float64Array.from(list, (_, i) => i);
          const { low, high } = envelope({ seconds, values }, { from_s: 0, to_s: list.length - 1 }, 13);
          const drawn = (side: Float64Array) => [...side].filter((value) => !Number.isNaN(value));
          expect(Math.max(...drawn(high))).toBe(Math.max(...list));
          expect(Math.min(...drawn(low))).toBe(Math.min(...list));
        },
      ),
    );
  });
});

/** A damped ring in closed form: series circuit, V = V0 e^(-at) cos(wt). */
function ringing({ inductance_H, capacitance_F, resistance_ohm }: Record<string, number>) {
  const a = resistance_ohm! / (2 * inductance_H!);
  const w = Math.sqrt(1 / (inductance_H! * capacitance_F!) - a * a);
  const seconds = Float64Array.from({ length: 4000 }, (_, i) => (i - 400) * 1e-10);
  const values = seconds.map((t) => (t < 0 ? 0 : -18_000 * Math.exp(-a * t) * Math.sin(w * t)));
  return { seconds, values };
}

describe('measuring a pulse', () => {
  it('finds peak, rise and start of a straight ramp between two points of the table', () => {
    const seconds = Float64Array.from({ length: 200 }, (_, i) => i * 1e-9);
    const values = seconds.map((t) => 2 + Math.min(1, Math.max(0, (t - 100.5e-9) / 20e-9)) * -1000);
    const figures = pulseFigures({ seconds, values });
    expect(figures.rest).toBe(2);
    expect(figures.peak).toBeCloseTo(-1000, 9);
    expect(figures.rise_s! * 1e9).toBeCloseTo(16, 6);
    expect(figures.start_s! * 1e9).toBeCloseTo(102.5, 6);
    expect(figures.half_s! * 1e9).toBeCloseTo(110.5, 6);
  });

  it('gives no rise for a trace without a pulse', () => {
    const seconds = Float64Array.from({ length: 20 }, (_, i) => i);
    expect(pulseFigures({ seconds, values: seconds.map(() => 5) })).toMatchObject({ peak: 0, rise_s: null });
  });

  it('finds the inductance of a damped ring within one percent of the circuit that made it', () => {
    const circuit = { inductance_H: 28e-9, capacitance_F: 1.1e-9, resistance_ohm: 1.2 };
    const trace = ringing(circuit);
    const ring = ringAfter(trace, pulseFigures(trace).peak_s);
    expect(ring).not.toBeNull();
    const found = ringInductance(ring!, circuit.capacitance_F)!;
    expect(found.value / circuit.inductance_H).toBeCloseTo(1, 2);
    expect(found.band.low).toBeLessThan(circuit.inductance_H);
    expect(found.band.high).toBeGreaterThan(circuit.inductance_H);
  });

  it('gives no ring where nothing rings', () => {
    const seconds = Float64Array.from({ length: 300 }, (_, i) => i * 1e-9);
    expect(ringAfter({ seconds, values: seconds.map((t) => Math.exp(-t / 5e-8)) }, 0)).toBeNull();
  });
});
