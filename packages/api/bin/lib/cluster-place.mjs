import { createHash } from 'node:crypto';
import { existsSync, statSync } from 'node:fs';
import { dirname, join } from 'node:path';

/**
 * Where the server keeps its files. Root starts it as another user, who must be able to walk down to
 * them; below a closed folder such as /root that fails, so they go to the package's own place instead.
 * @param {string} folder the folder of this cluster's things
 * @param {{ uid?: number, gid?: number }} user who runs the server
 * @returns {string}
 */
export function dataPlace(folder, user) {
  const wanted = join(folder, 'data');
  if (user.uid === undefined || mayWalkTo(folder, user)) return wanted;
  const name = createHash('sha256').update(folder).digest('hex').slice(0, 16);
  return `/var/lib/postgresql/driprail-${name}`;
}

/** Whether each existing folder on the way lets this user through. */
function mayWalkTo(folder, { uid, gid }) {
  for (let path = folder; ; path = dirname(path)) {
    if (existsSync(path)) {
      const { mode, uid: owner, gid: group } = statSync(path);
      const bit = owner === uid ? 0o100 : group === gid ? 0o010 : 0o001;
      if (!(mode & bit)) return false;
    }
    if (path === dirname(path)) return true;
  }
}
