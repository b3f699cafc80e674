import { Certificate, CertificateCreate } from "@beadroll/domain/schemas/lot";
import { type ReactElement, useState } from "react";
import { DateField } from "../../kit/fields/date-field.tsx";
import { FileDrop } from "../../kit/fields/file-drop.tsx";
import { SelectField } from "../../kit/fields/select-field.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { Form } from "../../kit/forms/form.tsx";
import { useForm } from "../../kit/forms/use-form.ts";
import { toast } from "../../kit/states/announcements.ts";
import { useAddCertificate } from "./lots.mutations.ts";

const TYPES = Certificate.shape.type.options;
const TYPE_WORDS = {
  "2.1": "2.1, declaration of compliance",
  "2.2": "2.2, test report",
  "3.1": "3.1, inspection certificate of the maker",
  "3.2": "3.2, inspection certificate of maker and inspector",
} as const;

/** Records a certificate with its document. */
export function CertificateForm(props: { tag: string }): ReactElement {
  const [files, setFiles] = useState<readonly File[]>([]);
  const add = useAddCertificate(props.tag);
  const form = useForm({
    schema: CertificateCreate,
    start: { type: "3.1" },
    draft: `certificate ${props.tag}`,
    onSubmit: async (certificate) => {
      await add.mutateAsync({ certificate, file: files[0] ?? null });
      setFiles([]);
      toast(`Certificate ${certificate.number} recorded`, "good");
      form.startAnew();
    },
  });
  return (
    <Form form={form} action="Record the certificate">
      <SelectField
        {...form.choice("type", TYPES)}
        label="Type, EN 10204"
        options={TYPES.map((value) => ({ value, label: TYPE_WORDS[value] }))}
      />
      <TextField {...form.text("number")} label="Certificate number" code />
      <TextField {...form.text("issuer")} label="Issued by" />
      <DateField {...form.text("issued_on")} label="Date of issue" />
      <FileDrop
        label="Document"
        name="file"
        files={files}
        onChange={setFiles}
        accept=".pdf,.png,.jpg,.jpeg"
        limit="PDF, PNG or JPEG"
      />
    </Form>
  );
}
