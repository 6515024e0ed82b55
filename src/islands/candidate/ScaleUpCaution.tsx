/** What the numbers of a screen do not know about a large vessel. */
export function ScaleUpCaution() {
  return (
    <div className="border-warning border-l-2 pl-3 text-[13.5px] leading-5">
      <p className="text-warning font-semibold">Before any scale-up</p>
      <p className="mt-1">
        Screen wells are small and isothermal. Heat production grows with the volume, while the
        cooling area per volume shrinks; pressure, gas evolution and mixing change too.
      </p>
      <p className="mt-1">
        A calorimetry and hazard review under local codes, by licensed staff, comes first. These
        numbers do not replace it.
      </p>
    </div>
  );
}
