export function SkipLink() {
  return (
    <a href="#main" className="sr-only focus:not-sr-only focus:fixed focus:top-3 focus:left-3 focus:z-30 focus:rounded-md focus:bg-tint focus:px-4 focus:py-2 focus:font-semibold focus:text-on-tint">
      Skip to the content
    </a>
  );
}
