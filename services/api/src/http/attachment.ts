/** Content-Disposition by RFC 6266: the name in UTF-8, and in plain letters for old clients. */
export function attachment(fileName: string): string {
  const plain = fileName.replace(/[^\w .-]/g, '_');
  const encoded = encodeURIComponent(fileName).replace(
    /['()*]/g,
    (sign) => `%${sign.charCodeAt(0).toString(16)}`,
  );
  return `attachment; filename="${plain}"; filename*=UTF-8''${encoded}`;
}
