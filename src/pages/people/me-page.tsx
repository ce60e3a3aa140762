export function MePage() { return <p>REPLACE-ME</p> }
