import type { MixRecord } from '../../../shared/api/catalogue.ts'
import { Button } from '../../ui/button.tsx'
import { Notice } from '../../ui/page.tsx'
import { type MixFormPart, lostWith, partNames } from './mix-draft.ts'
import { type Chosen, ProductPicker } from './product-picker.tsx'

/** One product alone, or up to three parts, each a product of the catalogue. */
export function PartsFields({ draft, change, fields, mix }: MixFormPart & { mix: MixRecord | undefined }) {
  const { parts } = draft
  const put = (index: number, product: Chosen | null) => change({ parts: parts.map((part, at) => (at === index ? product : part)) })
  const chosen = parts.flatMap((part) => (part ? [part.id] : []))
  const lost = lostWith(mix, parts.length)
  return (
    <fieldset className="grid gap-3 border-t border-rule pt-3 sm:col-span-2">
      <legend className="sr-only">Parts</legend>
      {parts.map((part, index) => (
        <ProductPicker
          key={partNames[index]}
          label={parts.length === 1 ? 'The product' : `Part ${partNames[index] ?? ''}`}
          name={`parts.${index}.productId`}
          chosen={part}
          onChoose={(product) => put(index, product)}
          without={chosen}
          error={fields[`parts.${index}.productId`]}
        />
      ))}
      {fields['parts'] && <p className="font-semibold text-stop">{fields['parts']}</p>}
      <div className="flex flex-wrap gap-2">
        {parts.length < 3 && <Button onClick={() => change({ parts: [...parts, null] })}>Add part {partNames[parts.length]}</Button>}
        {parts.length > 1 && (
          <Button onClick={() => change({ parts: parts.slice(0, -1) })}>
            {parts.length === 2 ? 'One product alone' : `Take out part ${partNames[parts.length - 1] ?? ''}`}
          </Button>
        )}
      </div>
      {lost.length > 0 && <Notice tone="caution">Saving takes out what no longer fits: {lost.join('; ')}. The history keeps it.</Notice>}
    </fieldset>
  )
}
