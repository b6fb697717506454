/** A set of programs that are needed, and so installed, together. */
export interface ToolGroup {
  /** Folder name of a private copy. */
  name: 'database' | 'browser' | 'pdf';
  purpose: string;
  /** Debian packages. The -core packages of MariaDB start no service of their own. */
  packages: string[];
  /** The programs that must be there, with the arguments that make each show its version and stop (null: a script without any). */
  programs: { name: string; versionArgs: string[] | null }[];
}

export const databaseTools: ToolGroup = {
  name: 'database',
  purpose: 'the database server',
  packages: ['mariadb-server-core', 'mariadb-client-core'],
  programs: [
    { name: 'mariadbd', versionArgs: ['--no-defaults', '--version'] },
    { name: 'mariadb-install-db', versionArgs: null },
  ],
};

export const browserTools: ToolGroup = {
  name: 'browser',
  purpose: 'the browser that the journeys are tested in',
  packages: ['chromium', 'fonts-dejavu-core'],
  programs: [{ name: 'chromium', versionArgs: ['--version'] }],
};

export const pdfTools: ToolGroup = {
  name: 'pdf',
  purpose: 'the readers that printed sheets are checked with',
  packages: ['poppler-utils', 'qpdf', 'mupdf-tools'],
  programs: [
    { name: 'pdftoppm', versionArgs: ['-v'] },
    { name: 'pdfinfo', versionArgs: ['-v'] },
    { name: 'pdftotext', versionArgs: ['-v'] },
    { name: 'qpdf', versionArgs: ['--version'] },
    { name: 'mutool', versionArgs: ['-v'] },
  ],
};
