import { CopyButton } from "@/app/components/ui/copy-button";
import { Ledger } from "@/app/components/ui/ledger";
import { Formula } from "./formula";

export interface GivenNumber {
  /** Typeset. */
  symbol: string;
  /** To 17 significant digits. */
  value: string;
  meaning: string;
}

export function GivenNumbers({ numbers }: { numbers: GivenNumber[] }) {
  if (numbers.length === 0) return null;
  return (
    <Ledger caption="Given numbers, to 17 digits">
      <thead>
        <tr>
          <th scope="col">Symbol</th>
          <th scope="col">Value</th>
          <th scope="col">Meaning</th>
          <th scope="col">
            <span className="sr-only">Copy</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {numbers.map((number) => (
          <tr key={number.symbol}>
            <td className="whitespace-nowrap">
              <Formula markup={number.symbol} />
            </td>
            <td className="num17">{number.value}</td>
            <td className="small quiet">{number.meaning}</td>
            <td className="num">
              <CopyButton text={number.value} />
            </td>
          </tr>
        ))}
      </tbody>
    </Ledger>
  );
}
