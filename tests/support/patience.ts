import { configure } from '@testing-library/react';

/** A large page takes seconds to draw and to search by role while other tests keep the machine busy. */
configure({ asyncUtilTimeout: 15_000 });
