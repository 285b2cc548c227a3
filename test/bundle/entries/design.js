export { design } from 'irisloom';
