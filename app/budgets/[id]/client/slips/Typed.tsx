import css from './slips.module.css'

/** A value as typed, its unit lighter than its number. */
export function Typed({ text }: { text: string }) {
  const parts = /^([±+−-]?\s*[\d.,]+(?:[eE][+-]?\d+)?)\s*(\D.*)$/.exec(text)
  if (!parts) return <>{text}</>
  return (
    <>
      {parts[1]} <span className={css.unit}>{parts[2]}</span>
    </>
  )
}
