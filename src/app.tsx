/** The whole app. */
export function App() {
  return <h1>Ribband</h1>;
}
