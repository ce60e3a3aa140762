export function EquipmentPage() { return <p>REPLACE-ME</p> }
