/** What is wrong with the whole form, in a sentence; nothing while nothing is. */
export function FormAlert({ errors, id }: { errors?: readonly string[] | null; id?: string }) {
  if (!errors?.length) return null;
  return (
    <div id={id} role="alert" tabIndex={-1} className="mb-4 rounded-md border-l-4 border-red bg-red-bg px-3.5 py-2.5 text-red">
      {errors.map((error) => (
        <p key={error}>{error}</p>
      ))}
    </div>
  );
}
