import { useLocation } from "react-router";

const rooms = [
  { value: "light", label: "Light" },
  { value: "dim", label: "Dim" },
  { value: "system", label: "As the device" },
] as const;

/** Chooses the room for this browser. A plain form: the server sets the cookie and the page comes back in the other room. */
export function RoomSwitch({ room }: { room: "light" | "dim" | "system" }) {
  const { pathname, search } = useLocation();
  return (
    <form method="post" action="/room" className="flex overflow-hidden rounded-md border border-rule-2" aria-label="Room">
      <input type="hidden" name="next" value={`${pathname}${search}`} />
      {rooms.map(({ value, label }) => (
        <button key={value} name="room" value={value} aria-pressed={room === value} className={`min-h-8 cursor-pointer px-2.5 text-[12.5px] ${room === value ? "bg-tint font-semibold text-on-tint" : "bg-sheet text-ink-2 hover:bg-tint-bg"}`}>
          {label}
        </button>
      ))}
    </form>
  );
}
