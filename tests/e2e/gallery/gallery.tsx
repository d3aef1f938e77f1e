import { createRoot } from 'react-dom/client';
import { HashRouter, Route, Routes } from 'react-router-dom';
import { ErrorPage } from '#src/components/error-page.tsx';
import { DeskScreen } from '#tests/e2e/gallery/desk-screen.tsx';
import { FormScreen } from '#tests/e2e/gallery/form-screen.tsx';
import { LineScreen } from '#tests/e2e/gallery/line-screen.tsx';
import { UpdateScreen } from '#tests/e2e/gallery/update-screen.tsx';
import '#tests/e2e/gallery/gallery.css';

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no #root');
createRoot(root).render(
  <HashRouter>
    <Routes>
      <Route path="/line" element={<LineScreen />} />
      <Route path="/form" element={<FormScreen />} />
      <Route path="/desk" element={<DeskScreen />} />
      <Route path="/update" element={<UpdateScreen />} />
      <Route path="/error" element={<ErrorPage error={new Error('no row of that id')} />} />
    </Routes>
  </HashRouter>,
);
