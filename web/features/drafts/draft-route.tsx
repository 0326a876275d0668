export { DraftPage as Component } from './components/draft-page';
