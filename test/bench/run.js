// `npm run bench -- NAME [arguments]` runs test/bench/NAME.js on the built core.
const [name = 'tour', ...rest] = process.argv.slice(2);
if (!/^[a-z]+$/i.test(name)) throw new Error(`no such bench: ${name}`);
process.argv = [process.argv[0], name, ...rest];
await import(`./${name}.js`);
