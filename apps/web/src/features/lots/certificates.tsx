import { getFile } from "@beadroll/domain/contract/records.contract";
import type { Certificate } from "@beadroll/domain/schemas/lot";
import { useQuery } from "@tanstack/react-query";
import { type ReactElement, useEffect, useState } from "react";
import { api } from "../../app/client.ts";
import { Button } from "../../kit/actions/button.tsx";
import { FaultPanel } from "../../kit/states/fault-panel.tsx";
import { Loading } from "../../kit/states/loading.tsx";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { DayText } from "../../kit/units/instant-text.tsx";

/** A stored document in place: PDF in a frame, pictures as pictures. */
function DocumentView(props: { digest: string; name: string }): ReactElement {
  const file = useQuery({
    queryKey: ["files", props.digest],
    queryFn: ({ signal }) => api.call(getFile, { params: { digest: props.digest }, signal }),
    staleTime: Number.POSITIVE_INFINITY,
  });
  const [address, setAddress] = useState<string | null>(null);
  // Object addresses belong to the browser and have to be given back.
  useEffect(() => {
    if (file.data === undefined) return undefined;
    const made = URL.createObjectURL(file.data);
    setAddress(made);
    return () => URL.revokeObjectURL(made);
  }, [file.data]);
  if (file.isError)
    return <FaultPanel problem={problemFrom(file.error)} onRetry={() => void file.refetch()} />;
  if (address === null || file.data === undefined) return <Loading label="The document" rows={6} />;
  if (file.data.type.startsWith("image/"))
    return <img src={address} alt={props.name} className="max-w-full" />;
  return <iframe src={address} title={props.name} className="h-[34rem] w-full border border-rule" />;
}

/** Values by name, as a small table of figures. */
function Figures(props: { caption: string; values: Readonly<Record<string, number>> }): ReactElement | null {
  const entries = Object.entries(props.values);
  if (entries.length === 0) return null;
  return (
    <div className="overflow-x-auto">
      <table className="border-collapse">
        <caption className="text-left text-sm text-ash">{props.caption}</caption>
        <thead>
          <tr>
            {entries.map(([name]) => (
              <th
                key={name}
                scope="col"
                className="border-b border-rule px-2 py-1 text-right text-sm first:pl-0"
              >
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          <tr>
            {entries.map(([name, value]) => (
              <td key={name} className="figures px-2 py-1 text-right first:pl-0">
                {value}
              </td>
            ))}
          </tr>
        </tbody>
      </table>
    </div>
  );
}

function CertificateArticle(props: { certificate: Certificate }): ReactElement {
  const { certificate } = props;
  const [open, setOpen] = useState(false);
  const { file_digest } = certificate;
  return (
    <article className="grid grid-cols-[minmax(0,1fr)] gap-2 border-t border-rule pt-3 first:border-t-0 first:pt-0">
      <h3 className="text-base">
        Certificate <span className="figures">{certificate.number}</span>, type {certificate.type}
      </h3>
      <p className="text-ash">
        {certificate.issuer}, <DayText day={certificate.issued_on} />
      </p>
      <Figures caption="Chemistry, percent by mass" values={certificate.chemistry} />
      <Figures caption="Mechanical values" values={certificate.mechanical} />
      {file_digest === null ? (
        <p className="text-ash">No document is stored for it.</p>
      ) : (
        <div>
          <Button onClick={() => setOpen(!open)} aria-expanded={open}>
            {open ? "Close the document" : "View the document"}
          </Button>
        </div>
      )}
      {open && file_digest !== null ? (
        <DocumentView digest={file_digest} name={`Certificate ${certificate.number}`} />
      ) : null}
    </article>
  );
}

/** The inspection documents of a lot (EN 10204). */
export function Certificates(props: { certificates: readonly Certificate[] }): ReactElement {
  if (props.certificates.length === 0) return <p className="text-ash">No certificate is recorded.</p>;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
      {props.certificates.map((certificate) => (
        <CertificateArticle key={certificate.id} certificate={certificate} />
      ))}
    </div>
  );
}
