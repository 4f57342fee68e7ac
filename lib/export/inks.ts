/** Print is black on white; hairlines and captions are greys that stay readable in greyscale. */
export const inks = {
  ink: '#15191c',
  soft: '#4a5257',
  line: '#747a7c',
  hair: '#b9b6ab',
  paper: '#ffffff',
  /** What people have put on the drawing. */
  pencil: '#7a4cc0',
} as const
