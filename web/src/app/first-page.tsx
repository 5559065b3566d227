import { Navigate } from 'react-router-dom';
import { useSessionUser } from '../lib/session';

export const Component = () => <Navigate to={useSessionUser().firstPath} replace />;
