/** Three tide lines, the uppermost straight: where the water stopped. */
export function StrandlineMark({ className }: { className?: string }) {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 26 22"
      className={className}
      fill="none"
      strokeWidth="2.4"
      strokeLinecap="round"
    >
      <path d="M2 3.2h22" className="stroke-ink" />
      <path d="M2 11c3-3.4 5.4-3.4 7.6-1.2s4.6 2.2 6.8.3 4.6-2 7.6.5" className="stroke-coral" />
      <path
        d="M2 18.6c3-3.4 5.4-3.4 7.6-1.2s4.6 2.2 6.8.3 4.6-2 7.6.5"
        className="stroke-coral"
        strokeOpacity=".5"
      />
    </svg>
  );
}
