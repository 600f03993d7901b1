select `job_facts`.`job_id` as `jobId`, `job_facts`.`make` as `make`, `job_facts`.`model` as `model`
from json_each(?) as wanted
cross join (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where job_facts.job_id = wanted.value;
