export default function Loading() {
  return <p role="status">Working…</p>;
}
