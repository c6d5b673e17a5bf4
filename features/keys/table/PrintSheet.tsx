export interface PrintSheetProps {
  /** how much smaller than on the screen */
  zoom: number;
}

/** On paper: A4 across, the table as wide as the page, and nothing that only a screen needs. */
export function PrintSheet({ zoom }: PrintSheetProps) {
  return (
    <style media="print">
      {`@page{size:A4 landscape;margin:9mm}
[role=banner]>div>a,[role=banner] [role=button],a[data-button],main [role=button],[role=main] [role=button],[data-screen]{display:none!important}
[role=main]{max-width:none!important}
[data-testid=key-table],[data-testid=compare]{zoom:${zoom};overflow:visible!important}
[data-testid=key-table] *,[data-testid=compare] *{position:static!important}
[data-testid=key-table] tr,[data-testid=compare] tr{break-inside:avoid}
*{print-color-adjust:exact;-webkit-print-color-adjust:exact}`}
    </style>
  );
}
