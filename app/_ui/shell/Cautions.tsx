interface CautionsProps {
  readonly title: string
  readonly sentences: readonly string[]
}

/** Cautions where strings are loaded: never hidden behind a click, printed too. */
export function Cautions({ title, sentences }: CautionsProps) {
  return (
    <section className="cautions" aria-label="Caution">
      <svg width="20" height="18" viewBox="0 0 20 18" aria-hidden="true">
        <path
          d="M10 1.2 19 16.8H1Z"
          fill="none"
          stroke="currentColor"
          strokeWidth="1.5"
          strokeLinejoin="round"
        />
        <path d="M10 6.5v5M10 13.3v1.6" stroke="currentColor" strokeWidth="1.7" />
      </svg>
      <div>
        <b>{title}</b>
        {sentences.length === 1 ? (
          <p>{sentences[0]}</p>
        ) : (
          <ul>
            {sentences.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        )}
      </div>
    </section>
  )
}
