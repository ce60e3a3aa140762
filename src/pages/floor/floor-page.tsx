export function FloorPage() { return <p>REPLACE-ME</p> }
