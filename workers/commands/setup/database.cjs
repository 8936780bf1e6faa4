// What sequelize-cli connects to: the same variable as the product, whatever NODE_ENV says.
const database = { use_env_variable: 'DATABASE_URL', dialect: 'postgres', logging: false };

module.exports = { development: database, test: database, production: database };
