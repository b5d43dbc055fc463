/** Names of the colours that marks are drawn with; what each looks like is the theme's business. */
export const inks = [
  'paper',
  'wash',
  'lit',
  'ink',
  'slate',
  'brass',
  'verdigris',
  'vermilion',
  'edge',
  'staff',
  'hair',
] as const

export type Ink = (typeof inks)[number]

export type Theme = Readonly<Record<Ink, string>>

export const lightTheme: Theme = {
  paper: '#FBFAF6',
  wash: '#F3EFE4',
  lit: '#F5ECDA',
  ink: '#1E1B16',
  slate: '#4A5A68',
  brass: '#8A5F1C',
  verdigris: '#2A6A5C',
  vermilion: '#B23A22',
  edge: '#857E6E',
  staff: '#B9B2A3',
  hair: '#E0DACC',
}

export const darkTheme: Theme = {
  paper: '#181612',
  wash: '#211E19',
  lit: '#2E2617',
  ink: '#EFEADF',
  slate: '#AAB8C4',
  brass: '#DDB06A',
  verdigris: '#79C2AD',
  vermilion: '#F28B72',
  edge: '#8A8272',
  staff: '#5F584B',
  hair: '#322D25',
}

/** White paper: what is printed or sent out has no page colour of its own. */
export const printTheme: Theme = { ...lightTheme, paper: '#FFFFFF', wash: '#EFEADB' }

export const themes = { light: lightTheme, dark: darkTheme, print: printTheme } as const

export type ThemeName = keyof typeof themes
