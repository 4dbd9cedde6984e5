/** Our mark: a uniaxial interference figure, two brushes crossed over rings. */
export function Mark({ size = 26 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" aria-hidden="true" className="shrink-0">
      <circle cx="16" cy="16" r="14.5" fill="none" stroke="var(--ink)" strokeWidth="1.6" />
      <circle cx="16" cy="16" r="10.6" fill="none" stroke="var(--tint)" strokeWidth="1.5" />
      <circle cx="16" cy="16" r="7" fill="none" stroke="var(--straw-mark)" strokeWidth="1.5" />
      <circle cx="16" cy="16" r="3.7" fill="none" stroke="var(--blue)" strokeWidth="1.4" />
      <path d="M16 1.5c1.9 5.2 1.9 8.6 0 14.5-1.9-5.9-1.9-9.3 0-14.5Zm0 29c-1.9-5.2-1.9-8.6 0-14.5 1.9 5.9 1.9 9.3 0 14.5ZM1.5 16c5.2-1.9 8.6-1.9 14.5 0-5.9 1.9-9.3 1.9-14.5 0Zm29 0c-5.2 1.9-8.6 1.9-14.5 0 5.9-1.9 9.3-1.9 14.5 0Z" fill="var(--ink)" />
    </svg>
  );
}
