import './components/theme/theme.css';
import { start } from './app/start';

start(document);
