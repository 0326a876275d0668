import { createRequire } from 'node:module';

const require = createRequire(import.meta.url);
const notoSans = (file: string) => require.resolve(`@expo-google-fonts/noto-sans/${file}.ttf`);

/** The same faces as on screen. Noto Sans Math carries the signs that Noto Sans lacks. */
export const pdfFonts = {
  NotoSans: {
    normal: notoSans('400Regular/NotoSans_400Regular'),
    bold: notoSans('600SemiBold/NotoSans_600SemiBold'),
    italics: notoSans('400Regular_Italic/NotoSans_400Regular_Italic'),
    bolditalics: notoSans('600SemiBold_Italic/NotoSans_600SemiBold_Italic'),
  },
  NotoSansMath: {
    normal: require.resolve('@fontsource/noto-sans-math/files/noto-sans-math-latin-400-normal.woff'),
  },
};

export const pdfFontFiles = new Set([
  ...Object.values(pdfFonts.NotoSans),
  ...Object.values(pdfFonts.NotoSansMath),
]);
