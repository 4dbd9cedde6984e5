/** Our mark: a uniaxial interference figure, two brushes crossed over rings. `size` in px at the usual text size. */
export function Mark({ size = 26 }: { size?: number }) {
  return (
    <svg width={`${size / 16}rem`} height={`${size / 16}rem`} viewBox="0 0 32 32" aria-hidden="true" className="shrink-0 fill-none print:stroke-ink">
      <circle cx="16" cy="16" r="14.4" strokeWidth="1.8" className="stroke-ink" />
      <circle cx="16" cy="16" r="10.4" strokeWidth="1.5" className="stroke-tint" />
      <circle cx="16" cy="16" r="6.9" strokeWidth="1.5" className="stroke-straw-mark" />
      <circle cx="16" cy="16" r="3.7" strokeWidth="1.3" className="stroke-blue" />
      <path
        className="fill-ink"
        stroke="none"
        d="M14.4 2h3.2c-.5 6-.9 10-1.1 13.5 3.5-.2 7.5-.6 13.5-1.1v3.2c-6-.5-10-.9-13.5-1.1.2 3.5.6 7.5 1.1 13.5h-3.2c.5-6 .9-10 1.1-13.5-3.5.2-7.5.6-13.5 1.1v-3.2c6 .5 10 .9 13.5 1.1-.2-3.5-.6-7.5-1.1-13.5Z"
      />
    </svg>
  );
}
