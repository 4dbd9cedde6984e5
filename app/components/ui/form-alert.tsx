import { Icon } from "./icon.tsx";

/** What is wrong with the whole form, in a sentence; nothing while nothing is. */
export function FormAlert({ errors, id }: { errors?: readonly string[] | null; id?: string }) {
  if (!errors?.length) return null;
  return (
    <div id={id} role="alert" tabIndex={-1} className="mb-4 flex gap-2.5 rounded-md border border-red bg-red-bg px-3.5 py-2.5 font-medium text-red">
      <span className="pt-0.5">
        <Icon name="alert" />
      </span>
      <div className="grid min-w-0 gap-1">
        {errors.map((error) => (
          <p key={error}>{error}</p>
        ))}
      </div>
    </div>
  );
}
