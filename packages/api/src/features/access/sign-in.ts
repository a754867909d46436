import passport from 'passport';
import { Strategy } from 'passport-local';
import { User } from '../../db/models/index.ts';
import { AppError } from '../../http/errors.ts';
import { asSignedIn } from '../../http/session.ts';
import { settled } from '../../http/settled.ts';
import { isPassword } from './passwords.ts';

/** Tells Passport how an e-mail and a password become a user. */
export function registerLocalStrategy(): void {
  passport.use(
    new Strategy({ usernameField: 'email' }, (email, password, done) => {
      verified(email, password).then(
        (user) => done(null, user ? asSignedIn(user) : false),
        (error: unknown) => done(error),
      );
    }),
  );
}

async function verified(email: string, password: string): Promise<User | null> {
  const user = await User.findOne({ where: { email: email.toLowerCase() } });
  const isRight = await isPassword(user?.passwordHash, password);
  return user?.isActive && isRight ? user : null;
}

/** The login of an e-mail and password, through Passport's local strategy. @throws 401 with one sentence for every failure */
export async function signInWith(email: string, password: string): Promise<User> {
  const signedIn = await new Promise<Express.User | false>((resolve, reject) => {
    const check = passport.authenticate('local', { session: false }, (error: unknown, user: Express.User | false) =>
      settled(() => resolve(user), reject)(error),
    ) as (req: unknown, res: unknown, next: (error: unknown) => void) => void;
    check({ body: { email, password } }, {}, reject);
  });
  const user = signedIn && (await User.findByPk(signedIn.id));
  if (!user) throw new AppError(401, 'wrong_login', 'That e-mail and password do not go together.');
  return user;
}
