select `job_ref` as `ref`
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `branch_id` = ? and `billed` = ? and `costed` = ? and `completed_on` between ? and ?
order by `completed_on` desc, `job_id` asc
limit ?;
