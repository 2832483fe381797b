import { AlignmentType, type ILevelsOptions, LevelFormat, LineRuleType } from 'docx'

export const partList = 'specification'
export const frontList = 'front'
const step = 400
const font = 'Source Sans 3'
const ink = '1D2226'
export const pencil = '55606A'

interface Label {
  level: number
  format: ILevelsOptions['format']
  text: string
  indent: number
}

const label = ({ level, format, text, indent }: Label): ILevelsOptions => ({
  level,
  format: format ?? LevelFormat.DECIMAL,
  text,
  alignment: AlignmentType.START,
  style: { paragraph: { indent: { left: indent + step, hanging: step } } },
})

/** PageFormat as a real multilevel list: PART 1, 1.01, A., 1., a., 1), a). Letters beyond Z are counted by the word processor: AA, BB. */
const partLevels: ILevelsOptions[] = [
  {
    level: 0,
    format: LevelFormat.DECIMAL,
    text: 'PART %1',
    alignment: AlignmentType.START,
    style: { paragraph: { indent: { left: 900, hanging: 900 } } },
  },
  {
    level: 1,
    format: LevelFormat.DECIMAL_ZERO,
    text: '%1.%2',
    alignment: AlignmentType.START,
    style: { paragraph: { indent: { left: 600, hanging: 600 } } },
  },
  label({ level: 2, format: LevelFormat.UPPER_LETTER, text: '%3.', indent: 0 }),
  label({ level: 3, format: LevelFormat.DECIMAL, text: '%4.', indent: step }),
  label({ level: 4, format: LevelFormat.LOWER_LETTER, text: '%5.', indent: 2 * step }),
  label({ level: 5, format: LevelFormat.DECIMAL, text: '%6)', indent: 3 * step }),
  label({ level: 6, format: LevelFormat.LOWER_LETTER, text: '%7)', indent: 4 * step }),
]
const frontLevels: ILevelsOptions[] = [
  label({ level: 0, format: LevelFormat.UPPER_LETTER, text: '%1.', indent: 0 }),
  label({ level: 1, format: LevelFormat.DECIMAL, text: '%2.', indent: step }),
]

export const numbering = {
  config: [
    { reference: partList, levels: partLevels },
    { reference: frontList, levels: frontLevels },
  ],
}

const headingOf = (size: number, before: number) => ({
  run: { font, size, bold: true, color: ink },
  paragraph: { spacing: { before, after: 60 }, keepNext: true },
})

/** Styles of the document. Sizes in half points, spacing in twentieths of a point. */
export const styles = {
  default: {
    document: {
      run: { font, size: 20, color: ink, language: { value: 'en-US' } },
      paragraph: { spacing: { after: 40, line: 264, lineRule: LineRuleType.AUTO } },
    },
    title: { run: { font, size: 32, bold: true, color: ink }, paragraph: { alignment: AlignmentType.CENTER, spacing: { after: 200 } } },
    heading1: headingOf(24, 360),
    heading2: headingOf(21, 220),
  },
  paragraphStyles: [
    {
      id: 'TableText',
      name: 'Table text',
      basedOn: 'Normal',
      run: { size: 17 },
      paragraph: { spacing: { after: 0, line: 240, lineRule: LineRuleType.AUTO } },
    },
    {
      id: 'TableNote',
      name: 'Table note',
      basedOn: 'Normal',
      run: { size: 17, color: pencil },
      paragraph: { spacing: { before: 60, after: 120 } },
    },
    { id: 'PageEdge', name: 'Page edge', basedOn: 'Normal', run: { size: 17, color: pencil } },
  ],
}
