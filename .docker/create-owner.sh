#!/bin/sh
# Runs once, when the database container makes its cluster: the role that owns the portal's schema is no superuser.
set -eu
psql --no-psqlrc --set=ON_ERROR_STOP=1 --username="${POSTGRES_USER:-postgres}" --dbname=postgres <<'SQL'
\getenv password PATHPORTAL_OWNER_PASSWORD
CREATE ROLE pathportal_owner LOGIN CREATEROLE PASSWORD :'password';
CREATE DATABASE pathportal OWNER pathportal_owner;
SQL
