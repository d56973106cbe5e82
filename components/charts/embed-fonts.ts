/**
 * An svg document with the page's fonts inside it: drawn as a picture it cannot ask for them. Only
 * faces that the page has loaded and the svg names are taken.
 */
export async function withFonts(svgText: string): Promise<string> {
  const loaded = new Set(
    [...document.fonts]
      .filter((face) => face.status === 'loaded')
      .map((face) => plain(face.family)),
  );
  const rules = await Promise.all(
    faceRules()
      .filter(({ family }) => loaded.has(family) && svgText.includes(family))
      .map(ruleWithFont),
  );
  const style = `<style>${rules.join('')}</style>`;
  return svgText.replace(/(<svg[^>]*>)/, `$1${style}`);
}

interface FaceRule {
  family: string;
  rule: CSSFontFaceRule;
  address: string;
}

function faceRules(): FaceRule[] {
  return [...document.styleSheets].flatMap((sheet) =>
    [...sheet.cssRules].flatMap((rule) => {
      if (!(rule instanceof CSSFontFaceRule)) return [];
      const source = /url\("?([^")]+)"?\)/.exec(rule.style.getPropertyValue('src'))?.[1];
      if (source === undefined) return [];
      const address = new URL(source, sheet.href ?? document.baseURI).href;
      return [{ family: plain(rule.style.getPropertyValue('font-family')), rule, address }];
    }),
  );
}

async function ruleWithFont({ family, rule, address }: FaceRule): Promise<string> {
  const response = await fetch(address);
  if (!response.ok) throw new Error(`the font ${family} could not be read`);
  const font = await dataAddress(await response.blob());
  const weight = rule.style.getPropertyValue('font-weight') || 'normal';
  const range = rule.style.getPropertyValue('unicode-range');
  return `@font-face{font-family:"${family}";font-weight:${weight};src:url("${font}")${range ? `;unicode-range:${range}` : ''}}`;
}

function dataAddress(blob: Blob): Promise<string> {
  return new Promise((resolve, reject) => {
    const reader = new FileReader();
    reader.onload = () => resolve(String(reader.result));
    reader.onerror = () => reject(reader.error ?? new Error('a font could not be read'));
    reader.readAsDataURL(blob);
  });
}

const plain = (family: string) => family.trim().replace(/^["']|["']$/g, '');
