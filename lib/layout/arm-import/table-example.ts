/** A table as it may be written, to be shown beside the import. Invented data. */
export const TABLE_EXAMPLE = `# convention: standard
joint;kind;a (mm);alpha (deg);d (mm);theta (deg);from (deg or mm);to (deg or mm);speed (deg/s or mm/s);ramp (deg/s2 or mm/s2)
1;turns;325;0;380;0;-132;132;430;2600
2;turns;275;180;0;0;-150;150;680;4200
3;slides;0;0;0;0;0;200;1100;9000
4;turns;0;0;0;0;-360;360;690;5200`;
