select `id`, `code`
from `packages`;
