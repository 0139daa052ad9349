import { readFileSync } from 'node:fs'

const FONTS = 'node_modules/@expo-google-fonts/work-sans'

/** The bundled lettering as the server reads it. */
export const pdfFonts = {
  regular: readFileSync(`${FONTS}/400Regular/WorkSans_400Regular.ttf`).toString('base64'),
  semibold: readFileSync(`${FONTS}/600SemiBold/WorkSans_600SemiBold.ttf`).toString('base64'),
}

export const pdfOptions = {
  fonts: pdfFonts,
  createdAt: '2026-12-01T09:30:00Z',
  fileId: '00112233445566778899aabbccddeeff',
  title: 'Profile sheet',
  author: 'Quayside Frames',
}
