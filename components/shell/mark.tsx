/** The sign of the product: a carpenter's triangle chalked over three pieces. */
export function Mark({ className = "size-6" }: { className?: string }) {
  return (
    <svg
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.8"
      strokeLinejoin="round"
      className={className}
      aria-hidden="true"
    >
      <path d="M12 3 22 21H2Z" />
      <path d="M9 8.4V21M15 8.4V21" strokeWidth="1.4" />
    </svg>
  );
}
