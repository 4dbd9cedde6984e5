export default function HomeRoute() {
  return (
    <main>
      <h1>Isogyre</h1>
    </main>
  );
}
