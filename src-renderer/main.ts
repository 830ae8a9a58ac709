import { mount } from 'svelte';
import App from './App.svelte';
import './app.css';
import { connectDesk } from './desk/desk-wire.ts';

const target = document.getElementById('app');
if (target === null) throw new Error('the page has no place for the program');

mount(App, { target, props: { wire: connectDesk() } });
