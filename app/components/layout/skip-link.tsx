export function SkipLink() {
  return (
    <a href="#main" className="sr-only focus:not-sr-only focus:absolute focus:top-2 focus:left-2 focus:z-20 focus:rounded-md focus:bg-tint focus:px-4 focus:py-2 focus:text-on-tint">
      Skip to the content
    </a>
  );
}
