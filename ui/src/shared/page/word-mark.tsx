/** The sign: a low sun over three beds. */
export function WordMark({ sizePx = 28 }: { sizePx?: number }) {
  return (
    <svg width={sizePx} height={sizePx} viewBox="0 0 28 28" aria-hidden="true">
      <circle cx="18.5" cy="8" r="3.6" fill="var(--slLoess)" />
      <g fill="none" stroke="var(--slSlate)" strokeWidth="2" strokeLinecap="round">
        <path d="M2 13.2c4-1.6 7 1.2 12 .2s8-2 12-.4" />
        <path d="M2 17.8c5-1.2 8 1.4 13 .3s8-1.6 11-.4" opacity=".7" />
        <path d="M2 22.6c4-1.4 9 .9 13 .1s7-1.4 11-.1" opacity=".45" />
      </g>
    </svg>
  );
}
