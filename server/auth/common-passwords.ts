/**
 * Passwords of eight characters and more that everyone tries first: keyboard runs, counting, the word itself in its
 * usual disguises, and the words of this trade.
 */
const WORDS = `
12345678 123456789 1234567890 0123456789 87654321 987654321 9876543210 11111111 00000000 22222222 88888888 99999999
12341234 11223344 12121212 69696969 147258369 159753456 123123123 112233445566 1q2w3e4r 1q2w3e4r5t 1qaz2wsx 1qazxsw2
q1w2e3r4 qwertyui qwertyuiop qwerty12 qwerty123 qwerty1234 qwertz123 qwertzui azertyui azerty123 asdfghjk asdfghjkl
asdfasdf zxcvbnm1 zxcvbnmm zaq12wsx abcdefgh abcdefghi abcd1234 abcd12345 abc12345 abc123456 a1b2c3d4 aa123456 a1234567
aaaaaaaa password password1 password12 password123 password1234 passw0rd passw0rd1 p@ssword p@ssw0rd pa55word passwort
passwort1 motdepasse contrasena wachtwoord drowssap letmein1 letmein123 letmein! welcome1 welcome123 changeme changeme1
changeme123 iloveyou iloveyou1 iloveyou2 sunshine sunshine1 princess princess1 football football1 baseball basketball
superman batman123 starwars trustno1 whatever computer internet administrator admin123 admin1234 adminadmin root1234
testtest test1234 testing123 default1 guest123 user1234 master123 monkey123 dragon123 shadow123 michael1 jennifer
charlie1 jordan23 samantha liverpool chocolate butterfly midnight december november september summer2024 winter2024
blacksmith bladesmith hammer123 damascus damascus1 pattern1 layerwright layerwright1 forgeforge anvil123 steel1234
`;

export const COMMON_PASSWORDS: ReadonlySet<string> = new Set(WORDS.trim().split(/\s+/));
