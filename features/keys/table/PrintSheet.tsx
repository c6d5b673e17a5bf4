export interface PrintSheetProps {
  /** how much smaller than on the screen */
  zoom: number;
}

/** On paper: A4 across, the table as wide as the page, and nothing that only a screen needs. */
export function PrintSheet({ zoom }: PrintSheetProps) {
  return (
    <style media="print">
      {`@page{size:A4 landscape;margin:9mm}
html,body,#root{background:#fff!important}
body{zoom:${zoom}}
[role=banner]>div+div,[role=main] [role=button],[data-testid=keys-further],[data-screen],[data-testid=decided],input[type=radio]{display:none!important}
[role=main]{max-width:none!important}
[data-testid=compare]{overflow:visible!important}
th,td{position:relative!important;left:auto!important;top:auto!important}
tr{break-inside:avoid}
*{print-color-adjust:exact;-webkit-print-color-adjust:exact}`}
    </style>
  );
}
