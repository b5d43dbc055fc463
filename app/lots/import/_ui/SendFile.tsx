'use client'

import { useRouter } from 'next/navigation'
import { type ChangeEvent, type DragEvent, useRef, useState } from 'react'

interface Refusal {
  readonly message: string
  readonly mend?: string
}

/** Sends a file as it is, with progress. Answers the import's number, or a sentence. */
function send(file: File, told: (share: number) => void): Promise<{ readonly id: number } | Refusal> {
  return new Promise((resolve) => {
    const request = new XMLHttpRequest()
    request.open('POST', `/api/v1/imports?name=${encodeURIComponent(file.name)}`)
    request.setRequestHeader('content-type', 'application/octet-stream')
    request.upload.onprogress = ({ lengthComputable, loaded, total }) => {
      if (lengthComputable && total > 0) told(loaded / total)
    }
    request.onload = () => {
      try {
        resolve(JSON.parse(request.responseText) as { id: number } | Refusal)
      } catch {
        resolve({ message: 'The server gave no answer that can be read.', mend: 'Try again.' })
      }
    }
    request.onerror = () =>
      resolve({ message: 'The file did not reach the server.', mend: 'Check the connection and try again.' })
    request.send(file)
  })
}

/** A place for a file: chosen, or dropped. Nothing is imported before somebody has looked at the preview. */
export function SendFile() {
  const router = useRouter()
  const input = useRef<HTMLInputElement>(null)
  const [over, setOver] = useState(false)
  const [share, setShare] = useState<number>()
  const [refusal, setRefusal] = useState<Refusal>()

  const take = async (file: File | undefined): Promise<void> => {
    if (!file || share !== undefined) return
    setRefusal(undefined)
    setShare(0)
    const answer = await send(file, setShare)
    if ('id' in answer) {
      router.push(`/lots/import/${answer.id}`)
      return
    }
    setShare(undefined)
    setRefusal(answer)
    if (input.current) input.current.value = ''
  }
  const drop = (event: DragEvent): void => {
    event.preventDefault()
    setOver(false)
    void take(event.dataTransfer.files[0])
  }
  return (
    <section
      className="import-drop"
      aria-label="Send a file"
      data-over={over || undefined}
      onDragOver={(event) => {
        event.preventDefault()
        setOver(true)
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
    >
      <label className="label" htmlFor="import-file">
        Bench file, CSV or XLSX
      </label>
      <input
        ref={input}
        id="import-file"
        type="file"
        accept=".csv,.tsv,.txt,.xlsx"
        disabled={share !== undefined}
        onChange={(event: ChangeEvent<HTMLInputElement>) => void take(event.target.files?.[0])}
      />
      <p className="hint">Choose it, or drop it here. You see how it is read before anything is stored.</p>
      <p role="status" className="import-sending">
        {share === undefined ? null : (
          <>
            <progress value={share} max={1} aria-label="Sent so far" />{' '}
            {share < 1 ? `${Math.round(share * 100)} % sent` : 'Looking at the file …'}
          </>
        )}
      </p>
      {refusal ? (
        <p role="alert" className="notice alarm">
          {refusal.message} {refusal.mend}
        </p>
      ) : null}
    </section>
  )
}
