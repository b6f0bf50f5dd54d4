'use client'
import { useState } from 'react'
import css from '../form.module.css'

/** A secret that is shown this once, with a button that copies it. */
export function Once({ label, secret, note }: { label: string; secret: string; note: string }) {
  const [copied, setCopied] = useState<boolean | null>(null)
  const copy = () => {
    navigator.clipboard.writeText(secret).then(
      () => setCopied(true),
      () => setCopied(false),
    )
  }
  return (
    <div className={css.once} role="status">
      <p>
        <strong>{label}</strong>
      </p>
      <p className={css.secret}>
        <code>{secret}</code>
        <button type="button" className={css.second} onClick={copy}>
          Copy
        </button>
      </p>
      <p className={css.hint}>{note}</p>
      {copied !== null && (
        <p className={copied ? css.done : css.wrong}>
          {copied ? 'Copied.' : 'The browser does not let this page copy; select the text instead.'}
        </p>
      )}
    </div>
  )
}
