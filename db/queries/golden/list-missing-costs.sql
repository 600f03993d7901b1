select missing.value ->> 'kind' as "kind", missing.value ->> 'code' as "code", min(missing.value ->> 'on') as "on"
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
cross join json_each(job_facts.missing_costs) as missing
where `missing_costs` is not null and `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?))
group by 1, 2
order by 1, 2;
