import type { ExportSummary } from '@siltlight/common/wire/exports';

export type Language = 'curl' | 'Python' | 'R';

type Wanted = Pick<ExportSummary, 'id' | 'fileName' | 'sha256'>;

/** A plain file name that no shell or script reads otherwise. */
const safe = (name: string) => name.replace(/[^\w.-]/g, '_');

/**
 * Ready to copy: fetch the file with an access token from the environment and compare its checksum. Python needs
 * requests; R needs nothing beyond itself, except openssl for the checksum where it is installed.
 */
export function fetchSnippet(language: Language, wanted: Wanted, origin: string): string {
  const address = `${origin}/api/v1/exports/${wanted.id}/file`;
  const file = safe(wanted.fileName ?? 'export');
  const sum = wanted.sha256 ?? '';
  if (language === 'curl') {
    return `curl --fail --header "Authorization: Bearer $SILTLIGHT_TOKEN" --output ${file} ${address}
echo "${sum}  ${file}" | sha256sum --check`;
  }
  if (language === 'Python') {
    return `import hashlib, os, requests

answer = requests.get(
    "${address}",
    headers={"Authorization": "Bearer " + os.environ["SILTLIGHT_TOKEN"]},
    timeout=60,
)
answer.raise_for_status()
assert hashlib.sha256(answer.content).hexdigest() == "${sum}"
with open("${file}", "wb") as file:
    file.write(answer.content)`;
  }
  return `download.file(
  "${address}",
  "${file}",
  mode = "wb",
  headers = c(Authorization = paste("Bearer", Sys.getenv("SILTLIGHT_TOKEN")))
)
# expected SHA-256: ${sum}
# R 4.5 or newer: tools::sha256sum("${file}")`;
}
