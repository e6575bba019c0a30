import { mount } from 'svelte';
import 'uplot/dist/uPlot.min.css';
import './styles/tokens.css';
import './styles/base.css';
import './styles/controls.css';
import './styles/tables.css';
import './styles/print.css';
import App from './App.svelte';

mount(App, { target: document.getElementById('page')! });
