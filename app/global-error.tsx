'use client'

/** The last resort, when even the frame of the pages failed; so it leans on nothing. */
export default function EverythingFailed({ retry }: { retry: () => void }) {
  return (
    <html lang="en">
      <body>
        <h1>Halfbaud cannot show this page</h1>
        <p>Edits that were not yet saved are kept on this computer and sent when the worksheet opens again.</p>
        <button type="button" onClick={retry}>
          Try again
        </button>
      </body>
    </html>
  )
}
