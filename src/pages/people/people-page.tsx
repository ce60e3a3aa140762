export function PeoplePage() { return <p>REPLACE-ME</p> }
