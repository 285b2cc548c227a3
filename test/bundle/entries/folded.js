export { folded, generalizedChebyshev, transversal } from 'irisloom';
