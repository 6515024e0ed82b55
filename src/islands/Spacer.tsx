/** Stands in a table for rows that are not drawn. */
export function Spacer({ height }: { height: number }) {
  if (height <= 0) return null;
  return (
    <tr aria-hidden="true" className="spacer">
      <td style={{ height }} />
    </tr>
  );
}
