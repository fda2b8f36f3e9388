import { Liquid, LiquidError, type FS } from 'liquidjs';

/** Characters, milliseconds and objects: enough for a page of text; a template that wants more is refused. */
const LIMITS = { parseLimit: 20_000, renderLimit: 1_000, memoryLimit: 200_000 } as const;
const REFUSED_TAGS = ['include', 'render', 'layout', 'block'] as const;

export type TemplateProblem = { line: number; column: number; message: string };

/** No template reads a file: every look-up finds nothing. */
const NO_FILES: FS = {
  exists: () => Promise.resolve(false),
  existsSync: () => false,
  readFile: () => Promise.reject(new Error('Templates read no files')),
  readFileSync: () => {
    throw new Error('Templates read no files');
  },
  resolve: (_dir, file) => file,
  contains: () => Promise.resolve(false),
  containsSync: () => false,
};

const engine = makeEngine();

function makeEngine(): Liquid {
  const liquid = new Liquid({
    fs: NO_FILES,
    relativeReference: false,
    cache: false,
    strictVariables: true,
    strictFilters: true,
    ownPropertyOnly: true,
    greedy: false,
    ...LIMITS,
  });
  for (const name of REFUSED_TAGS)
    liquid.registerTag(name, {
      parse() {
        throw new Error(`"${name}" is not used here. Write the text itself.`);
      },
      render() {
        return '';
      },
    });
  // A date would read the clock, and the same report must say the same for ever.
  liquid.registerFilter('date', refuseClock);
  for (const name of ['date_to_xmlschema', 'date_to_rfc822', 'date_to_string', 'date_to_long_string'])
    liquid.registerFilter(name, refuseClock);
  liquid.registerFilter('sample', () => {
    throw new Error('"sample" picks at random, and a report must say the same for ever.');
  });
  return liquid;
}

function refuseClock(): never {
  throw new Error('Dates are printed by the report, not by a template.');
}

/**
 * Renders a Liquid template with the given values and nothing else: no files, no clock, no inherited properties.
 * Throws a LiquidError where it is not well formed, names a value that does not exist, or is too large.
 */
export function renderTemplate(text: string, values: Readonly<Record<string, unknown>>): string {
  return engine.parseAndRenderSync(text, { ...values });
}

/**
 * What is wrong with a template, at its line and column (both from 1); null where it renders with these values.
 * Both sides of every condition are looked at, so that an unknown name cannot hide in one.
 */
export function findTemplateProblem(text: string, values: Readonly<Record<string, unknown>>): TemplateProblem | null {
  try {
    const templates = engine.parse(text);
    const unknown = firstUnknownName(text, values);
    if (unknown) return unknown;
    engine.renderSync(templates, { ...values });
    return null;
  } catch (error) {
    return problemOf(error);
  }
}

function firstUnknownName(text: string, values: Readonly<Record<string, unknown>>): TemplateProblem | null {
  const { globals } = engine.parseAndAnalyzeSync(text);
  for (const [name, uses] of Object.entries(globals)) {
    if (Object.hasOwn(values, name)) continue;
    const [use] = uses;
    return {
      line: use?.location.row ?? 1,
      column: use?.location.col ?? 1,
      message: `There is no "${name}" to use here.`,
    };
  }
  return null;
}

function problemOf(error: unknown): TemplateProblem {
  // Limits on size are plain errors without a place in the text.
  if (!LiquidError.is(error))
    return { line: 1, column: 1, message: error instanceof Error ? error.message : String(error) };
  const [line, column] = error.token.getPosition();
  const [message] = error.message.split(/, (?:line|file):/);
  return { line: line ?? 1, column: column ?? 1, message: message ?? 'This template cannot be read.' };
}
