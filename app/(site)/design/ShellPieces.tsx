import { NavLine } from "../../_components/shell/NavLine";
import { Piece } from "./Piece";

export function ShellPieces() {
  return (
    <Piece name="shell/NavLine, as in shell/AppShell">
      <div className="w-52 border bg-card px-4 py-3">
        <NavLine
          groups={[
            { items: [{ href: "/overview", label: "Overview" }, { href: "/design", label: "Keys" }, { href: "/usage", label: "Usage" }, { href: "/bench", label: "Bench" }] },
            { heading: "Organisation", items: [{ href: "/team", label: "Team" }, { href: "/settings", label: "Settings" }] },
          ]}
        />
      </div>
    </Piece>
  );
}
