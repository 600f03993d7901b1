select `code` as `code`, `temperature_c` as `temperatureC`, `humidity_pct` as `humidityPct`, `so2_deposition` as `so2Deposition`, `chloride_deposition` as `chlorideDeposition`
from `regions`
where code in (select value from json_each(?)) and `temperature_c` is not null;
