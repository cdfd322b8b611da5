import { installScript, missingPackages, PACKAGES_TO_RUN, PACKAGES_TO_TEST } from './apt.mjs';

describe('Debian packages', () => {
  it('are missing when one of their programs is', () => {
    const has =
      (...programs: string[]) =>
      (name: string) =>
        programs.includes(name) ? `/usr/bin/${name}` : undefined;
    const names = (find: (name: string) => string | undefined) =>
      missingPackages(PACKAGES_TO_TEST, find).map(({ name }) => name);
    expect(names(has('chromium', 'pdftotext', 'mariadbd'))).toEqual(['mariadb-server']);
    expect(names(() => '/usr/bin/any')).toEqual([]);
  });

  it('are installed without starting a server, replacing one, or leaving one switched on', () => {
    const script = installScript(PACKAGES_TO_RUN, () => true);
    const [guard, install, off] = ['exit 101', 'install -y', 'systemctl disable --now mariadb'].map((part) =>
      script.indexOf(part),
    );
    expect(guard).toBeGreaterThan(0);
    expect(install).toBeGreaterThan(guard ?? 0);
    expect(off).toBeGreaterThan(install ?? 0);
    expect(installScript(PACKAGES_TO_RUN, () => false)).not.toContain('systemctl');
    expect(script).toContain('--no-remove mariadb-server\n');
  });
});
