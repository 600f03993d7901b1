select `branch_id` as `branchId`, json_group_array(job_ref) as "refs", json_group_array(completed_on) as "completedOn", json_group_array(package_id * 8 + age_band) as "cells", json_group_array(est_minutes) as "estimated", json_group_array(act_minutes) as "actual"
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `has_estimate` = ? and `completed_on` between ? and ?
group by `branch_id`
order by `branch_id` asc;
