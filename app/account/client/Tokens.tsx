'use client'
import { useState } from 'react'
import { callApi } from '../../form/client/callApi'
import form from '../../form/form.module.css'
import { When } from '../../words/client/When'
import { TokenForm } from './TokenForm'
import { isToken, type Token } from './token'

/** The own tokens: made, shown once, revoked. */
export function Tokens({ tokens: given }: { tokens: readonly Token[] }) {
  const [tokens, setTokens] = useState(given)
  const [failed, setFailed] = useState<string | null>(null)

  const revoke = async ({ id, name }: Token) => {
    const answer = await callApi('DELETE', `/api/v1/tokens/${encodeURIComponent(id)}`)
    if (!answer.ok && answer.problem.code !== 'not-found') return setFailed(`${name}: ${answer.problem.sentence}`)
    setFailed(null)
    setTokens((all) => all.filter((token) => token.id !== id))
  }

  return (
    <>
      {tokens.length === 0 ? (
        <p className={form.hint}>You have no tokens.</p>
      ) : (
        <div className={form.scroll}>
          <table className={form.table}>
            <thead>
              <tr>
                <th scope="col">For</th>
                <th scope="col">Made</th>
                <th scope="col">Ends</th>
                <th scope="col">Last used</th>
                <th scope="col">
                  <span>Revoke</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {tokens.map((token) => (
                <tr key={token.id}>
                  <th scope="row">{token.name}</th>
                  <td>
                    <When time={token.createdAt} />
                  </td>
                  <td>{token.expiresAt === null ? 'never' : new Date(token.expiresAt).toISOString().slice(0, 10)}</td>
                  <td>{token.lastUsedAt === null ? 'not yet' : <When time={token.lastUsedAt} />}</td>
                  <td>
                    <button
                      type="button"
                      className={form.quiet}
                      aria-label={`Revoke the token ${token.name}`}
                      onClick={() => revoke(token)}
                    >
                      Revoke
                    </button>
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      <div role="alert">{failed && <p className={form.wrong}>{failed}</p>}</div>
      <TokenForm onMade={(token) => isToken(token) && setTokens((all) => [...all, token])} />
    </>
  )
}
