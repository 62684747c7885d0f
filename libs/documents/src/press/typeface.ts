import fontkit from '@pdf-lib/fontkit';

/** The bytes of the two TrueType fonts a paper is set in. The library reads no files. */
export interface PaperFonts {
  readonly regular: Uint8Array;
  readonly bold: Uint8Array;
}

export type Weight = keyof PaperFonts;

type ParsedFont = ReturnType<typeof fontkit.create>;

/** One glyph as the embedder wants it; ours carries the code point it was asked for, whatever was drawn earlier. */
interface PlainGlyph {
  readonly id: number;
  readonly advanceWidth: number;
  readonly codePoints: number[];
}

interface Face {
  readonly font: ParsedFont;
  readonly glyphs: Map<number, PlainGlyph | null>;
  /** glyph → the lowest code point that shows it, so that two look-alikes never differ by history */
  readonly canonical: ReadonlyMap<number, number>;
}

/** What stands where a character has no glyph in the font. */
export const REPLACEMENT_CHARACTER = 0xfffd;

// Arabic, Hebrew, Indic and their presentation forms need the font's own shaping.
const SHAPED = /[\u0590-\u109f\u1780-\u18af\ufb1d-\ufdff\ufe70-\ufefc]/;
// Control characters, zero-width marks and direction overrides: they print nothing, or lie about order.
const SILENT = /[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u00ad\u061c\u200b-\u200f\u202a-\u202e\u2060-\u206f\ufe00-\ufe0f\ufeff]/g;

const parsed = new WeakMap<Uint8Array, Face>();

function faceOf(bytes: Uint8Array): Face {
  const known = parsed.get(bytes);
  if (known) return known;
  const font = fontkit.create(bytes);
  const canonical = new Map<number, number>();
  for (const codePoint of [...font.characterSet].sort((a, b) => a - b)) {
    const { id } = font.glyphForCodePoint(codePoint);
    if (!canonical.has(id)) canonical.set(id, codePoint);
  }
  const face: Face = { font, glyphs: new Map(), canonical };
  parsed.set(bytes, face);
  return face;
}

function glyphOf(face: Face, codePoint: number): PlainGlyph | null {
  const known = face.glyphs.get(codePoint);
  if (known !== undefined) return known;
  let glyph: PlainGlyph | null = null;
  if (face.font.hasGlyphForCodePoint(codePoint)) {
    const { id, advanceWidth } = face.font.glyphForCodePoint(codePoint);
    glyph = { id, advanceWidth, codePoints: [face.canonical.get(id) ?? codePoint] };
  }
  face.glyphs.set(codePoint, glyph);
  return glyph;
}

/**
 * Measures and cleans text for one paper, and remembers which characters the font did not have.
 *
 * Parsing a font costs more than setting an invoice, so a parsed font is kept for as long as its bytes
 * are; what it returns does not depend on what was set before, so the same paper gives the same bytes.
 */
export class Typeface {
  private readonly faces: Record<Weight, Face>;
  private readonly missing = new Set<string>();

  constructor(private readonly fonts: PaperFonts) {
    this.faces = { regular: faceOf(fonts.regular), bold: faceOf(fonts.bold) };
  }

  /** Characters replaced so far, sorted. */
  get replaced(): readonly string[] {
    return [...this.missing].sort();
  }

  bytesOf(weight: Weight): Uint8Array {
    return this.fonts[weight];
  }

  /** Composed form, no silent characters, and a visible mark where the font has no glyph. Line breaks stay. */
  clean(text: string, weight: Weight = 'regular'): string {
    const face = this.faces[weight];
    let result = '';
    for (const character of text.normalize('NFC').replace(/\r\n?|[\u2028\u2029]/g, '\n').replace(/\t/g, ' ').replace(SILENT, '')) {
      const codePoint = character.codePointAt(0) ?? REPLACEMENT_CHARACTER;
      if (character === '\n' || glyphOf(face, codePoint)) {
        result += character;
      } else {
        this.missing.add(character);
        result += String.fromCodePoint(REPLACEMENT_CHARACTER);
      }
    }
    return result;
  }

  /** Width in points of cleaned text. */
  widthOf(text: string, sizePt: number, weight: Weight = 'regular'): number {
    const face = this.faces[weight];
    let units = 0;
    if (SHAPED.test(text)) {
      for (const glyph of face.font.layout(text, NO_LIGATURES).glyphs) units += glyph.advanceWidth;
    } else {
      for (const character of text) units += (glyphOf(face, character.codePointAt(0) ?? 0) ?? glyphOf(face, REPLACEMENT_CHARACTER))?.advanceWidth ?? 0;
    }
    return (units * sizePt) / face.font.unitsPerEm;
  }

  /**
   * A stand-in for the font parser that hands the embedder our own simple layout for simple scripts:
   * no ligatures, no kerning the page would ignore anyway, and no look-up a second time.
   */
  parserFor(weight: Weight): { create: (bytes: Uint8Array) => ParsedFont } {
    const face = this.faces[weight];
    return {
      create: () => {
        const light = Object.create(face.font) as ParsedFont & { layout: ParsedFont['layout'] };
        light.layout = ((text: string) => {
          if (SHAPED.test(text)) return face.font.layout(text, NO_LIGATURES);
          const glyphs: PlainGlyph[] = [];
          for (const character of text) {
            const glyph = glyphOf(face, character.codePointAt(0) ?? 0) ?? glyphOf(face, REPLACEMENT_CHARACTER);
            if (glyph) glyphs.push(glyph);
          }
          return { glyphs };
        }) as unknown as ParsedFont['layout'];
        return light;
      },
    };
  }
}

const NO_LIGATURES = { liga: false, clig: false, dlig: false };
