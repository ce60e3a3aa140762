export function ReceivePage() { return <p>REPLACE-ME</p> }
