import { Form, useLocation } from "react-router";

const rooms = [
  { value: "light", label: "Light" },
  { value: "dim", label: "Dim" },
  { value: "system", label: "As the device" },
] as const;

/** Chooses the room for this browser: the server sets the cookie and the page comes back in the other room. Works without script. */
export function RoomSwitch({ room }: { room: "light" | "dim" | "system" }) {
  const { pathname, search } = useLocation();
  return (
    <Form method="post" action="/room" preventScrollReset className="no-print">
      <input type="hidden" name="next" value={`${pathname}${search}`} />
      <div role="group" aria-label="Room" className="inline-flex">
        {rooms.map(({ value, label }) => (
          <button
            key={value}
            name="room"
            value={value}
            aria-pressed={room === value}
            className={`-ml-px min-h-8 cursor-pointer border px-3 text-sm first-of-type:ml-0 first-of-type:rounded-l-md last-of-type:rounded-r-md pointer-coarse:min-h-11 ${
              room === value ? "z-10 border-tint bg-tint font-semibold text-on-tint" : "border-rule-2 bg-sheet text-ink-2 hover:bg-tint-bg hover:text-tint"
            }`}
          >
            {label}
          </button>
        ))}
      </div>
    </Form>
  );
}
