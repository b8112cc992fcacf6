import * as fc from 'fast-check';
import { STARTERS, type Design } from '../design/index.js';
import { type Forging, evaluate } from '../forging/index.js';
import {
  LOSSLESS,
  type StepPlan,
  alternating,
  barFrom,
  billet,
  designOf,
  stackOf,
} from '../forging/testing/designs.js';
import { formatFor } from '../units/index.js';
import * as z from 'zod';
import {
  CHECKS,
  type Evaluation,
  WARNING_SEVERITIES,
  assess,
  evaluation,
  evaluationSchema,
  retold,
  warningsOf,
} from './index.js';
import { layersOf, steelOf } from './testing/cases.js';

const INCH = formatFor('inch');
const WELD: StepPlan = { kind: 'weld', heats: 2 };

/** One design that makes nearly every rule speak, and a few more for the rest. */
function loudDesigns(): readonly Design[] {
  const chrome = steelOf('chrome', { C: 1.45, Cr: 2 }, { name: 'Chrome steel' });
  const loud = designOf(
    [
      barFrom('loose', stackOf(layersOf(['chrome', 'nickel-200', 'nickel-200'], 60), 900, 40), [
        { kind: 'draw', thicknessMm: 20, heats: 1, temperatureC: 1300 },
        { kind: 'weld', heats: 1, temperatureC: 1300 },
        { kind: 'twist', turns: 200, hand: 'right', reversals: 0 },
        { kind: 'corner' },
      ]),
      barFrom(
        'thin',
        stackOf([{ steel: 'cartridge-brass', thicknessMm: 0.1 }, ...layersOf(['1084', 'wire-rope'])]),
        [WELD],
      ),
      barFrom('end', { kind: 'assembly', along: 'width', pieces: [{ bar: 'loose' }, { bar: 'thin' }] }, [
        WELD,
      ]),
    ],
    { steels: [chrome], blank: { lengthMm: 2000, widthMm: 500, thicknessMm: 200 } },
  );
  const fine = billet(alternating(40, ['1084', '5160'], [1, 1]), [WELD, { kind: 'draw', thicknessMm: 0.5 }], {
    allowances: LOSSLESS,
  });
  return [loud, fine];
}

describe('warningsOf', () => {
  const all = loudDesigns().flatMap((design) => warningsOf(evaluate(design)));

  it('has a rule of its own name for each code, and a design that makes each speak', () => {
    const codes = CHECKS.map(({ code }) => code);
    expect(new Set(codes).size).toBe(codes.length);
    expect(codes.filter((code) => !all.some((warning) => warning.code === code))).toEqual([]);
  });

  it('gives exactly the fields of the API, and whole sentences', () => {
    for (const warning of all) {
      expect(Object.keys(warning).sort()).toEqual(
        ['bar', 'code', 'message', 'remedy', 'severity', 'source', 'stepId', 'values'].sort(),
      );
      for (const words of [warning, retold(warning, INCH)]) {
        const text = `${words.message} ${words.remedy}`;
        expect(text)
          .withContext(warning.code)
          .not.toMatch(/NaN|undefined|null|Infinity|–|\[object| {2}/);
        expect(words.message)
          .withContext(warning.code)
          .toMatch(/^[A-Z“0-9].*[.]$/);
        expect(words.remedy)
          .withContext(warning.code)
          .toMatch(/^[A-Z].*[.]$/);
      }
      expect(warning.source)
        .withContext(warning.code)
        .toMatch(/Follows from|[Cc]ommon practice|published|[Ss]ource/);
    }
  });

  it('puts the gravest first, then the order of the document', () => {
    for (const design of loudDesigns()) {
      const warnings = warningsOf(evaluate(design));
      const places = design.bars.flatMap((bar) => [
        `${bar.id}/null`,
        ...bar.steps.map((step) => `${bar.id}/${step.id}`),
      ]);
      const rank = warnings.map(({ severity, bar, stepId }) => [
        WARNING_SEVERITIES.indexOf(severity),
        places.indexOf(`${bar}/${stepId}`),
      ]);
      expect(rank.every(([, place]) => place !== -1)).toBeTrue();
      rank.slice(1).forEach(([severity, place], i) => {
        const [severityBefore, placeBefore] = rank[i] as [number, number];
        expect(severity).toBeGreaterThanOrEqual(severityBefore);
        if (severity === severityBefore) expect(place).toBeGreaterThanOrEqual(placeBefore);
      });
    }
  });

  it('is told in the reader’s units, and a warning may be told anew from its values', () => {
    for (const design of loudDesigns()) {
      const forging = evaluate(design);
      expect(warningsOf(forging).map((warning) => retold(warning, INCH))).toEqual(
        warningsOf(forging, INCH) as never,
      );
    }
    const inches = loudDesigns().flatMap((design) => warningsOf(evaluate(design), INCH));
    expect(inches.some(({ message }) => / in\b/.test(message))).toBeTrue();
    expect(inches.some(({ message, remedy }) => /\d mm|°C/.test(message + remedy))).toBeFalse();
  });

  it('finds nothing wrong with a sound plan', () => {
    const plans: StepPlan[] = [
      { kind: 'weld', heats: 2 },
      { kind: 'draw', thicknessMm: 12, lengthMm: 400, heats: 4 },
      { kind: 'restack', pieces: 4, turnAlternate: false },
      { kind: 'weld', heats: 2 },
      { kind: 'draw', thicknessMm: 20, heats: 2 },
    ];
    expect(warningsOf(evaluate(billet(alternating(13), plans)))).toEqual([]);
  });
});

describe('warningsOf: a fold keeps what was warned of before', () => {
  /** Rules that speak of the end of the bar, which a fold changes. */
  const OF_THE_END = new Set(['bands-thin', 'contrast-low', 'blank-too-large', 'seams-open']);
  const ids = [
    '1084',
    '15n20',
    'd2',
    '26c3',
    'nickel-200',
    'leaf-spring-reclaimed',
    'cartridge-brass',
    '52100',
  ];
  const layers = fc.array(
    fc.record({ steel: fc.constantFrom(...ids), thicknessMm: fc.double({ min: 0.05, max: 9, noNaN: true }) }),
    { minLength: 1, maxLength: 12 },
  );
  const step: fc.Arbitrary<StepPlan> = fc.oneof(
    fc.record({ kind: fc.constant('weld' as const), heats: fc.integer({ min: 0, max: 4 }) }),
    fc.record({
      kind: fc.constant('draw' as const),
      heats: fc.integer({ min: 0, max: 3 }),
      lengthMm: fc.double({ min: 60, max: 800, noNaN: true }),
    }),
    fc.constant<StepPlan>({ kind: 'restack', pieces: 3, turnAlternate: true }),
    fc.constant<StepPlan>({ kind: 'fold' }),
    fc.constant<StepPlan>({ kind: 'corner', heats: 1 }),
    fc.constant<StepPlan>({ kind: 'twist', turns: 9, hand: 'left', reversals: 0 }),
  );

  it('for any plan', () => {
    let compared = 0;
    fc.assert(
      fc.property(layers, fc.array(step, { maxLength: 6 }), (stack, plans) => {
        const kept = (steps: readonly StepPlan[]): unknown[] =>
          warningsOf(evaluate(billet(stack, steps))).filter(({ code }) => !OF_THE_END.has(code));
        const before = kept(plans);
        const after = kept([...plans, { kind: 'fold' }]).map((warning) => JSON.stringify(warning));
        compared += before.length;
        for (const warning of before) expect(after).toContain(JSON.stringify(warning));
      }),
      { seed: 20_260, numRuns: 120 },
    );
    expect(compared).toBeGreaterThan(200);
  });
});

describe('evaluation', () => {
  const designs = [...STARTERS.map(({ design }) => design), ...loudDesigns()];

  it('is plain JSON in the form that the schema states', () => {
    for (const design of designs) {
      const { evaluation: own } = assess(design);
      const json: unknown = JSON.parse(JSON.stringify(own));
      expect(json).withContext(design.name).toEqual(own);
      expect(evaluationSchema.safeParse(json).error?.issues).withContext(design.name).toBeUndefined();
    }
  });

  it('has a JSON schema, for the documentation of the API', () => {
    const schema = z.toJSONSchema(evaluationSchema) as { required?: string[] };
    expect(schema.required?.sort()).toEqual(['bars', 'carbon', 'result', 'stock', 'totals', 'warnings']);
  });

  it('holds every bar’s states, the result, totals and stock of the forging', () => {
    const design = billet(alternating(13), [WELD]);
    const { forging, evaluation: own } = assess(design);
    expect(Object.keys(own.bars)).toEqual(['billet']);
    expect(own.bars['billet']?.states.map(({ stepId }) => stepId)).toEqual([null, 'billet-1']);
    expect(own.bars['billet']?.refusal).toBeUndefined();
    expect(own.result).toEqual(own.bars['billet']?.states[1] as never);
    expect(own.totals).toEqual(forging.totals);
    expect(own.stock).toEqual([
      { steel: '1084', thicknessMm: 3, widthMm: 40, lengthMm: 150, pieces: 7 },
      { steel: '15n20', thicknessMm: 2, widthMm: 40, lengthMm: 150, pieces: 6 },
    ]);
    // By mass: 7 · 3 mm of 0.84 % and 6 · 2 mm of 0.75 %, both 7850 kg/m³.
    expect(own.carbon?.meanPercent).toBeCloseTo((21 * 0.84 + 12 * 0.75) / 33, 12);
  });

  it('has no result, totals or carbon while a step is refused, and says why in words', () => {
    const restack: StepPlan = { kind: 'restack', pieces: 12, turnAlternate: false };
    const plans: StepPlan[] = [{ kind: 'draw', lengthMm: 10, widthMm: 40 }, restack];
    const own: Evaluation = evaluation(evaluate(billet(alternating(3), plans)));
    expect(own.result).toBeNull();
    expect(own.totals).toBeNull();
    expect(own.carbon).toBeNull();
    expect(own.bars['billet']?.states.length).toBe(2);
    expect(own.bars['billet']?.refusal).toEqual({
      code: 'too-short',
      stepId: 'billet-2',
      field: 'pieces',
      asked: 16.5,
      available: 10,
      unit: 'mm',
      message: '“Restack” in “billet”: 12 pieces need 16.5 mm of saw cuts, the bar is 10 mm long.',
    });
    expect(own.warnings.length).toBeGreaterThan(0);
  });

  it('takes what it can from the forging before', () => {
    const design = billet(alternating(13), [WELD, { kind: 'draw', lengthMm: 200, heats: 1 }]);
    const first: Forging = assess(design).forging;
    expect(first.stepsForged).toBe(2);
    const again = assess({ ...design, name: 'Other' }, first);
    expect(again.forging.stepsForged).toBe(0);
    expect(again.evaluation).toEqual(assess(design).evaluation);
  });

  it('keeps bars apart whatever they are called', () => {
    const design = designOf([barFrom('__proto__', stackOf(alternating(3)))]);
    const json = JSON.parse(JSON.stringify(assess(design).evaluation)) as Evaluation;
    expect(Object.keys(json.bars)).toEqual(['__proto__']);
  });
});
